/** Decodes one scalar: a word, a name, a whole number, a quantity, a range or text, as its place asks for. */
import { readQuantity } from '../units/read-quantity';
import { numberAhead, scaled } from '../units/number-text';
import { readRange } from '../units/read-range';
import { readRoot } from '../units/read-root';
import { oneSpelling } from '../units/one-spelling';
import type { QuantityFault } from '../units/fault';
import { rootHz } from './declaration/bounds';
import { expected } from './expected';
import { errorAt, writeInstead } from './local-problem';
import type { LocalProblem } from './local-problem';
import { nearest } from './nearest';
import { boundFault, rangeFault } from './out-of-range';
import { scalarText } from './scalar-text';
import type { Scalar } from './shape';
import type { ScalarNode } from './tree';

/** A decoded scalar, or its fault. */
export type ScalarReading = { readonly value: unknown } | { readonly fault: LocalProblem };

/** Decodes a scalar by its source text; YAML's own types never apply. */
export function decodeScalar(scalar: Scalar, node: ScalarNode): ScalarReading {
  const { text } = node;
  if (scalar.words !== undefined && Object.hasOwn(scalar.words, text)) return { value: text };
  if (scalar.laterWords !== undefined && Object.hasOwn(scalar.laterWords, text)) {
    return { fault: errorAt(node, 'unknown-name', `\`${text}\` is not supported yet: ${expected({ scalar })} is`) };
  }
  const refused =
    scalar.refusedWords !== undefined && Object.hasOwn(scalar.refusedWords, text) ? scalar.refusedWords[text] : undefined;
  if (refused !== undefined) return { fault: errorAt(node, 'unknown-name', refused) };
  if (isNumeric(text) || !(scalar.words ?? scalar.name ?? scalar.text)) {
    const measured = decodeMeasured(scalar, node);
    if (measured !== null) return measured;
  }
  if (scalar.name !== undefined) return { value: { refersTo: text } };
  if (scalar.text === true) return { value: text };
  return { fault: unknownWord(scalar, node) };
}

const isNumeric = (text: string) => /^[-+±\u2212.]?\s*\.?\d|^[±.…]/.test(oneSpelling(text));

/** Whole numbers, ranges and quantities; null where none of them is asked for. */
function decodeMeasured(scalar: Scalar, node: ScalarNode): ScalarReading | null {
  if (scalar.wholeRange !== undefined && node.text.includes('..')) return decodeWholeRange(scalar.wholeRange, node);
  if (scalar.root !== undefined) return decodeRoot(scalar.root, node);
  if (scalar.number !== undefined) return decodeNumber(scalar.number, node);
  if (scalar.whole !== undefined) return decodeWhole(scalar, scalar.whole, node);
  if (scalar.range !== undefined && (scalar.quantity === undefined || looksLikeRange(node.text)))
    return decodeRange(scalar, node);
  if (scalar.quantity !== undefined) return decodeQuantity(scalar, node);
  return null;
}

const looksLikeRange = (text: string) => /\.\.|…|^\s*(?:±|\+\/-|\+-)/.test(text);

function decodeQuantity(scalar: Scalar, node: ScalarNode): ScalarReading {
  const reading = readQuantity(node.text, scalar.quantity ?? []);
  if ('fault' in reading) return { fault: quantityFault(reading.fault, node) };
  const { quantity } = reading;
  if (quantity.tolerance !== undefined && scalar.tolerance !== true) {
    const bare = oneSpelling(node.text).replace(/ *[±+].*$/, '');
    const message = `no tolerance can stand behind \`${bare}\` here: tolerances stand behind parts, clocks and tones, and in \`tolerance\` of a stage`;
    return { fault: errorAt(node, 'not-a-quantity', message, [writeInstead(node, bare)]) };
  }
  const fault = boundFault(quantity, () => oneSpelling(node.text), scalar.bounds);
  return fault === null ? { value: quantity } : { fault: errorAt(node, 'out-of-range', fault) };
}

function decodeRange(scalar: Scalar, node: ScalarNode): ScalarReading {
  const reading = readRange(node.text, scalar.range ?? []);
  if ('fault' in reading) return { fault: quantityFault(reading.fault, node) };
  const fault = rangeFault(reading.range, scalar);
  if (fault === null) return { value: reading.range };
  return { fault: errorAt(node, 'out-of-range', fault.message, fault.meant === null ? [] : [writeInstead(node, fault.meant)]) };
}

function quantityFault(fault: QuantityFault, node: ScalarNode): LocalProblem {
  return errorAt(
    node,
    fault.code,
    fault.message,
    fault.suggestions.map((suggestion) => writeInstead(node, suggestion)),
  );
}

function decodeWhole(scalar: Scalar, [least, most]: readonly [number, number], node: ScalarNode): ScalarReading {
  const value = wholeNumber(node.text);
  if (value === null) {
    const meant = /^(\d+) ?[a-z]+$/.exec(node.text)?.[1];
    const cures = meant === undefined ? [] : [writeInstead(node, meant)];
    return { fault: errorAt(node, 'not-a-quantity', `\`${node.text}\` is not ${expected({ scalar })}`, cures) };
  }
  if (value >= least && value <= most) return { value };
  return { fault: outside(node, node.text, least, most) };
}

function decodeNumber([least, most]: readonly [number, number], node: ScalarNode): ScalarReading {
  const plain = oneSpelling(node.text);
  const ahead = numberAhead(plain);
  if (ahead?.rest.trim() === '') {
    const value = scaled(ahead.digits, 0);
    return value >= least && value <= most ? { value } : { fault: outside(node, plain, least, most) };
  }
  const meant = /^\d+,\d+$/.test(plain) ? plain.replace(',', '.') : ahead?.digits;
  const cures = meant === undefined ? [] : [writeInstead(node, meant)];
  return { fault: errorAt(node, 'not-a-quantity', `\`${plain}\` is not a plain number such as \`0.707\``, cures) };
}

function decodeRoot(as: 'pole' | 'zero', node: ScalarNode): ScalarReading {
  const reading = readRoot(node.text);
  if ('fault' in reading) return { fault: quantityFault(reading.fault, node) };
  const { re, im } = reading.root;
  const [least, most] = rootHz;
  const absurd = [re, im].some((part) => part !== 0 && (Math.abs(part) < least || Math.abs(part) > most));
  const shown = oneSpelling(node.text);
  if (absurd) return { fault: errorAt(node, 'out-of-range', `\`${shown}\` is out of range: from 1 nHz to 1000 THz`) };
  if (as === 'zero' || re < 0) return { value: reading.root };
  const message = `a pole at \`${shown}\` does not decay: its real part must be below zero`;
  return { fault: errorAt(node, 'out-of-range', message, re === 0 ? [] : [writeInstead(node, `-${shown.replace(/^\+/, '')}`)]) };
}

function decodeWholeRange([least, most]: readonly [number, number], node: ScalarNode): ScalarReading {
  const [from, to] = oneSpelling(node.text)
    .split('..')
    .map((end) => wholeNumber(end.trim()));
  if (typeof from !== 'number' || typeof to !== 'number') {
    return { fault: errorAt(node, 'not-a-quantity', `\`${node.text}\` is not a range of whole numbers such as \`120 .. 480\``) };
  }
  if (from < least || to > most) return { fault: outside(node, node.text, least, most) };
  if (from <= to) return { value: { from, to } };
  return { fault: errorAt(node, 'out-of-range', `\`${node.text}\` runs backwards`, [writeInstead(node, `${to} .. ${from}`)]) };
}

const wholeNumber = (text: string) => (/^[+-]?\d+$/.test(oneSpelling(text)) ? Number(oneSpelling(text)) : null);

const outside = (node: ScalarNode, text: string, least: number, most: number) =>
  errorAt(node, 'out-of-range', `\`${text}\` is out of range: from ${least} to ${most}`);

function unknownWord(scalar: Scalar, node: ScalarNode): LocalProblem {
  const meant = nearest(node.text, Object.keys({ ...scalar.words, ...scalar.laterWords }));
  const hint = meant === null ? '' : `; did you mean \`${meant}\`?`;
  const cures = meant === null ? [] : [writeInstead(node, scalarText(meant))];
  return errorAt(node, 'unknown-name', `\`${node.text}\` is not known here: it takes ${expected({ scalar })}${hint}`, cures);
}
