/** Reads a pole or a zero as a frequency: `-1200 Hz`, `-800 ± 600j Hz`, `± 50j Hz`. */
import { notAQuantity } from './fault';
import type { QuantityFault } from './fault';
import { numberAhead, scaled } from './number-text';
import { oneSpelling } from './one-spelling';
import { readSingle } from './read-single';
import { readUnit } from './read-unit';

/** A root in Hz; where `im` is above zero it stands for itself and its conjugate. */
export interface RootPair {
  readonly re: number;
  readonly im: number;
}

/** A root, or why there is none. */
export type RootReading = { readonly root: RootPair } | { readonly fault: QuantityFault };

/** Reads one root, or a pair of conjugates. @param text a scalar's source text */
export function readRoot(text: string): RootReading {
  const plain = oneSpelling(text);
  const parts = /^(?<re>[^±]*?) *± *(?<im>.*)$/.exec(plain)?.groups;
  if (parts !== undefined) return pairOf(plain, parts['re'] ?? '', parts['im'] ?? '');
  const lone = /^(?<re>.*\d) *[+-] *(?<im>[\d.]+ *[ij] *\D*)$/.exec(plain)?.groups;
  if (lone !== undefined) {
    const meant = `${lone['re'] ?? ''} ± ${lone['im'] ?? ''}`;
    return { fault: notAQuantity(`\`${plain}\` has no conjugate: complex roots come in pairs`, meant) };
  }
  const single = readSingle(plain, ['frequency']);
  return 'fault' in single ? { fault: single.fault } : { root: { re: single.value, im: 0 } };
}

function pairOf(plain: string, reText: string, imText: string): RootReading {
  const im = numberAhead(imText);
  const unit = /^ *[ij] *(.*)$/.exec(im?.rest ?? '')?.[1]?.trim();
  if (im === null || unit === undefined) {
    return { fault: notAQuantity(`\`${plain}\` is not a root: write it like \`-800 ± 600j Hz\``, ...withJ(reText, imText)) };
  }
  const read = readUnit(unit);
  if (read?.unit !== 'Hz')
    return { fault: notAQuantity(`\`${plain}\` needs a frequency's unit behind it, such as \`Hz\` or \`kHz\``) };
  const re = reText === '' ? { digits: '0', rest: '' } : numberAhead(reText);
  const own = re?.rest.trim() === '' ? read : readUnit(re?.rest.trim() ?? '');
  if (re === null || own?.unit !== 'Hz')
    return { fault: notAQuantity(`\`${plain}\` is not a root: write it like \`-800 ± 600j Hz\``) };
  return { root: { re: scaled(re.digits, own.power), im: Math.abs(scaled(im.digits, read.power)) } };
}

/** `-800 ± 600 Hz` only lacks its j. */
function withJ(reText: string, imText: string): readonly string[] {
  const im = numberAhead(imText);
  return im === null || readUnit(im.rest.trim())?.unit !== 'Hz' ? [] : [`${reText} ± ${im.digits}j ${im.rest.trim()}`.trim()];
}
