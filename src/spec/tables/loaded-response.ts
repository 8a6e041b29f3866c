/** The gain of a measured two-port: S21 as it stands, or load voltage over source voltage between given resistances. */
import type { ResponseTable } from '../model-stage';
import { divided, minus, one, scaledBy, times } from './complex';
import type { Complex, Network } from './spec-table';
import { responseOf } from './response-of';

/** The resistances that a two-port works between. */
export interface Loads {
  readonly sourceOhm: number;
  readonly loadOhm: number;
}

/**
 * The response of a network. With loads:
 * V_L/V_S = S21·(1 − Γs)·(1 + ΓL) / (2·((1 − S11·Γs)(1 − S22·ΓL) − S12·S21·Γs·ΓL)), Γ = (R − R0)/(R + R0) (common practice); with
 * both at R0 it is S21/2, 6.02 dB less than S21.
 */
export function loadedResponse(
  network: Network,
  loads: Loads | null,
): { readonly table: ResponseTable } | { readonly fault: string } {
  const gains = loads === null ? network.s21 : network.s21.map((_, index) => loadedGain(network, loads, index));
  return responseOf(network.frequenciesHz, gains);
}

function loadedGain({ s11, s21, s12, s22, referenceOhm }: Network, { sourceOhm, loadOhm }: Loads, index: number): Complex {
  const atSource = (sourceOhm - referenceOhm) / (sourceOhm + referenceOhm);
  const atLoad = (loadOhm - referenceOhm) / (loadOhm + referenceOhm);
  const zero = { re: 0, im: 0 };
  const [p11, p21, p12, p22] = [s11[index] ?? zero, s21[index] ?? zero, s12[index] ?? zero, s22[index] ?? zero];
  const direct = times(minus(one, scaledBy(p11, atSource)), minus(one, scaledBy(p22, atLoad)));
  const around = scaledBy(times(p12, p21), atSource * atLoad);
  return divided(scaledBy(p21, (1 - atSource) * (1 + atLoad)), scaledBy(minus(direct, around), 2));
}
