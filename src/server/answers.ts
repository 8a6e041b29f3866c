/** What the answers to all requests have in common: parameters are checked at the door, and a request that was cancelled is still answered. */
import { ErrorCodes, LSPErrorCodes, ResponseError, type CancellationToken } from 'vscode-languageserver';

/** The parameters, or the answer that they are not what the method takes. */
export function check<P>(params: P, guard: (params: unknown) => boolean): P {
  if (guard(params)) return params;
  throw new ResponseError(ErrorCodes.InvalidParams, 'The parameters are not what this method takes.');
}

/** Ends a request that its sender has cancelled. */
export function refuseIfCancelled(token: CancellationToken): void {
  if (token.isCancellationRequested) throw new ResponseError(LSPErrorCodes.RequestCancelled, 'Cancelled by the client.');
}

/** The answer to a request whose document has moved on while it was worked on. */
export function contentModified(): ResponseError {
  return new ResponseError(LSPErrorCodes.ContentModified, 'The document has a newer version.');
}
