/** Jacobi functions against their identities and closed forms, moduli near 0 and near 1 included. */
import assert from 'node:assert/strict';
import { jacobi, modulusOfDegree, quarterPeriods, type Modulus } from '../../../src/signal/families/jacobi';
import { assertClose, roundingRelative } from '../../support/tolerance';

function byComplement(complement: number): Modulus {
  return { k: Math.sqrt((1 - complement) * (1 + complement)), complement };
}

const moduli: readonly Modulus[] = [
  { k: 1e-12, complement: 1 },
  { k: 0.6, complement: 0.8 },
  { k: 0.96, complement: 0.28 },
  byComplement(1e-5),
  byComplement(1e-12),
];

describe('jacobi', () => {
  it('has its closed form at half a quarter period', () => {
    // sn² = 1/(1 + k′), cn² = k′/(1 + k′), dn² = k′.
    for (const modulus of moduli) {
      const { sn, cn, dn } = jacobi(0.5, modulus);
      assertClose(sn * sn, 1 / (1 + modulus.complement), roundingRelative);
      assertClose(cn * cn, modulus.complement / (1 + modulus.complement), roundingRelative);
      assertClose(dn * dn, modulus.complement, roundingRelative);
    }
  });

  it('is sine and cosine at modulus 0', () => {
    for (const u of [0, 0.1, 0.7, 1]) {
      const { sn, cn, dn } = jacobi(u, { k: 0, complement: 1 });
      assertClose(sn, Math.sin((Math.PI / 2) * u), roundingRelative);
      assertClose(cn, Math.sin((Math.PI / 2) * (1 - u)), roundingRelative);
      assert.equal(dn, 1);
    }
  });

  it('keeps sn² + cn² = 1, dn² = k′² + k²·cn², and its mirror image at the end of the quarter period', () => {
    for (const modulus of moduli) {
      for (const u of [0.001, 0.05, 0.3, 0.8, 0.999]) {
        const { sn, cn, dn } = jacobi(u, modulus);
        assertClose(sn * sn + cn * cn, 1, roundingRelative);
        assertClose(dn * dn, modulus.complement ** 2 + (modulus.k * cn) ** 2, roundingRelative);
        const other = jacobi(1 - u, modulus);
        assertClose(other.sn, cn / dn, 1e-10);
        assertClose(other.cn, (modulus.complement * sn) / dn, 1e-10);
      }
    }
  });
});

describe('quarterPeriods', () => {
  it('turns sn/cn back into its argument', () => {
    for (const modulus of moduli) {
      for (const u of [0.001, 0.2, 0.5, 0.9, 0.9999]) {
        const { sn, cn } = jacobi(u, modulus);
        assertClose(quarterPeriods(sn / cn, modulus), u, 1e-11);
      }
    }
  });
});

describe('modulusOfDegree', () => {
  it('changes nothing at degree 1, and degree 2 is one step of Landen’s transformation', () => {
    for (const modulus of [...moduli.slice(1), byComplement(0.9999)]) {
      const same = modulusOfDegree(1, modulus);
      assertClose(same.k, modulus.k, 1e-11);
      assertClose(same.complement, modulus.complement, 1e-11);
      // Upwards: k = 2√k₁/(1 + k₁), k′ = (1 − k₁)/(1 + k₁).
      const doubled = modulusOfDegree(2, modulus);
      assertClose(doubled.k, (2 * Math.sqrt(modulus.k)) / (1 + modulus.k), 1e-11);
      assertClose(doubled.complement, modulus.complement ** 2 / (1 + modulus.k) ** 2, 1e-11);
    }
  });
});
