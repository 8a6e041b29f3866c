/** High-pass, band-pass and band-stop filters from low-pass ones, root by root, without losing digits in narrow bands. */
import { complexRoot, type Complex } from '../complex';
import type { Filter } from '../filter';
import type { Enclosure } from '../response';
import type { Root } from '../sections';

/**
 * The high-pass whose gain at f is that of a low-pass at corner/f.
 *
 * @param lowPass with its corner at 1 Hz.
 * @param cornerHz > 0; what happens at 1 Hz happens there.
 * @example highPass(realPole(1), 1000).poles[0].re // -1000
 */
export function highPass(lowPass: Filter, cornerHz: number): Filter {
  const turned = (root: Root): Root => reciprocal(root, cornerHz);
  return {
    poles: lowPass.poles.map(turned),
    zeros: [...lowPass.zeros.map(turned), ...atOrigin(lowPass)],
    gainAt: { frequencyHz: Infinity, gain: lowPass.gainAt.gain },
    turnsHz: lowPass.turnsHz?.map((turn) => cornerHz / turn).reverse() ?? null,
  };
}

/**
 * The band-pass whose gain at f is that of a low-pass at |f² − f₀²|/(f·width), f₀ = √(low·high) and width = high − low.
 *
 * @param lowPass with its corner at 1 Hz and its gain stated at 0 Hz.
 * @param edges what happens at 1 Hz happens at both; 0 < low < high.
 * @example bandPass(realPole(1), { low: 900, high: 1100 }).gainAt.frequencyHz // 994.987437
 */
export function bandPass(lowPass: Filter, edges: Enclosure): Filter {
  const { middleHz, widthHz } = bandOf(edges);
  const both = (root: Root): readonly Root[] => split({ re: 0.5 * widthHz * root.re, im: 0.5 * widthHz * root.im }, middleHz);
  return {
    poles: ofUpper(lowPass.poles, both),
    zeros: [...ofUpper(lowPass.zeros, both), ...atOrigin(lowPass)],
    gainAt: { frequencyHz: middleHz, gain: lowPass.gainAt.gain },
    turnsHz: turnsAround(lowPass, middleHz, both),
  };
}

/**
 * The band-stop whose gain at f is that of a low-pass at f·width/|f² − f₀²|.
 *
 * @param lowPass with its corner at 1 Hz and its gain stated at 0 Hz.
 * @param edges what happens at 1 Hz happens at both; 0 < low < high.
 * @example bandStop(realPole(1), { low: 900, high: 1100 }).zeros[0].im // 994.987437
 */
export function bandStop(lowPass: Filter, edges: Enclosure): Filter {
  const { middleHz, widthHz } = bandOf(edges);
  const both = (root: Root): readonly Root[] => split(reciprocal(root, 0.5 * widthHz), middleHz);
  const missing = atOrigin(lowPass).flatMap((): Root[] => [
    { re: 0, im: middleHz },
    { re: 0, im: -middleHz },
  ]);
  return {
    poles: ofUpper(lowPass.poles, both),
    zeros: [...ofUpper(lowPass.zeros, both), ...missing],
    gainAt: lowPass.gainAt,
    turnsHz: turnsAround(lowPass, middleHz, both),
  };
}

function bandOf({ low, high }: Enclosure): { readonly middleHz: number; readonly widthHz: number } {
  if (!(low > 0 && low < high && high < Infinity))
    throw new RangeError(`A band needs two edges above 0 Hz, the lower first, not ${low} .. ${high}.`);
  return { middleHz: Math.sqrt(low * high), widthHz: high - low };
}

/** A zero at 0 Hz for every zero that the low-pass has at infinity. */
function atOrigin({ poles, zeros }: Filter): readonly Root[] {
  return Array.from({ length: poles.length - zeros.length }, () => ({ re: 0, im: 0 }));
}

/** c/root in the half plane of its mirror image, which of a pair is listed anyway. */
function reciprocal({ re, im }: Root, c: number): Root {
  if (re === 0) return { re: 0, im: c / im };
  if (im === 0) return { re: c / re, im: 0 };
  const square = re * re + im * im;
  return { re: (c * re) / square, im: (c * im) / square };
}

/** What becomes of the roots of the upper half plane and the real axis, with the mirror images of all that is complex. */
function ofUpper(roots: readonly Root[], both: (root: Root) => readonly Root[]): readonly Root[] {
  return roots.filter((root) => root.im >= 0).flatMap((root) => (root.im === 0 ? both(root) : both(root).flatMap(withMirror)));
}

function withMirror({ re, im }: Root): readonly Root[] {
  const upper = Math.abs(im);
  return [
    { re, im: upper },
    { re, im: -upper },
  ];
}

/**
 * Both roots of s² − 2h·s + f₀² for re h ≤ 0, im h ≥ 0. The larger one adds parts of one sign only; the smaller one is what the product f₀²
 * leaves, which keeps the digits that subtracting would lose.
 */
function split(h: Complex, middleHz: number): readonly Root[] {
  if (h.im === 0 && -h.re < middleHz) {
    const im = Math.sqrt((middleHz - h.re) * (middleHz + h.re));
    return [
      { re: h.re, im },
      { re: h.re, im: -im },
    ];
  }
  const root = complexRoot({ re: (h.re - middleHz) * (h.re + middleHz) - h.im * h.im, im: 2 * h.re * h.im });
  const larger = { re: h.re - root.re, im: h.im + Math.abs(root.im) };
  const share = middleHz / Math.hypot(larger.re, larger.im);
  return [larger, { re: larger.re * share * share, im: -larger.im * share * share }];
}

/** Turning points on both sides of the middle, which is one itself: the low-pass is symmetrical about 0 Hz. */
function turnsAround({ turnsHz }: Filter, middleHz: number, both: (root: Root) => readonly Root[]): readonly number[] | null {
  if (turnsHz === null) return null;
  const sides = turnsHz.flatMap((turn) => both({ re: 0, im: turn }).map(({ im }) => Math.abs(im)));
  return [...sides, middleHz].sort((one, other) => one - other);
}
