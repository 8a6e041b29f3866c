/** The few operations on complex numbers that network tables need. */
import type { Complex } from './spec-table';

/** 1. */
export const one: Complex = { re: 1, im: 0 };

/** a − b. */
export const minus = (a: Complex, b: Complex): Complex => ({ re: a.re - b.re, im: a.im - b.im });

/** a·b. */
export const times = (a: Complex, b: Complex): Complex => ({ re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re });

/** a·k. */
export const scaledBy = (a: Complex, k: number): Complex => ({ re: a.re * k, im: a.im * k });

/** a/b. */
export function divided(a: Complex, b: Complex): Complex {
  const square = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / square, im: (a.im * b.re - a.re * b.im) / square };
}
