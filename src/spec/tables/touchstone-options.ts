/** Reads the option line of a Touchstone file: `# GHz S MA R 50`, in any order and case. */
import type { Complex } from './spec-table';

/** How the numbers of a file count. */
export interface Options {
  /** Power of ten from the written frequency to Hz. */
  readonly power: number;
  readonly referenceOhm: number;
  readonly complex: (first: number, second: number) => Complex;
}

const powers: Readonly<Record<string, number>> = { HZ: 0, KHZ: 3, MHZ: 6, GHZ: 9 };

const polar = (size: number, degrees: number): Complex => {
  const angle = (degrees * Math.PI) / 180;
  return { re: size * Math.cos(angle), im: size * Math.sin(angle) };
};

const formats: Readonly<Record<string, Options['complex']>> = {
  MA: polar,
  DB: (db, degrees) => polar(10 ** (db / 20), degrees),
  RI: (re, im) => ({ re, im }),
};

/** The options of a line; what it leaves out is GHz, S, MA and 50 Ω. */
export function readOptions(text: string): Options | { readonly fault: string } {
  const words = text.replace(/^#/, '').trim().toUpperCase().split(/\s+/).filter(Boolean);
  let options: Options = { power: 9, referenceOhm: 50, complex: polar };
  for (let at = 0; at < words.length; at += 1) {
    const word = words[at] ?? '';
    const power = Object.hasOwn(powers, word) ? powers[word] : undefined;
    const complex = Object.hasOwn(formats, word) ? formats[word] : undefined;
    if (power !== undefined) options = { ...options, power };
    else if (complex !== undefined) options = { ...options, complex };
    else if (word === 'R') {
      at += 1;
      const referenceOhm = Number(words[at] ?? Number.NaN);
      if (!(referenceOhm > 0) || !Number.isFinite(referenceOhm))
        return { fault: 'the option line names no reference resistance behind `R`' };
      options = { ...options, referenceOhm };
    } else if (/^[YZHG]$/.test(word)) return { fault: `the file holds ${word} parameters: S parameters are needed` };
    else if (word !== 'S') return { fault: `\`${word}\` is no option of a Touchstone file: it reads like \`# GHz S MA R 50\`` };
  }
  return options;
}
