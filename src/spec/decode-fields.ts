/** Decodes a map with known keys: unknown, repeated, missing and contradicting ones are told apart, each at its own key. */
import { orList } from '../units/fault';
import { errorAt, writeInstead } from './local-problem';
import type { LocalProblem } from './local-problem';
import { nearest } from './nearest';
import type { Fields, Key } from './shape';
import type { MapNode, Pair } from './tree';
import type { Home, Walk } from './walk';

/** Decodes the map; what is absent is absent, what is faulty is null. */
export function decodeFields(
  map: Fields,
  node: MapNode,
  home: Home,
  problems: LocalProblem[],
  walk: Walk,
): Record<string, unknown> {
  const found: Record<string, unknown> = {};
  const first = firstOfEach(node, map, problems);
  const company = companyOf(map, first);
  for (const pair of first.values()) {
    const key = keyOf(map, pair.key);
    const fault = key === null ? unknownKey(map, pair) : misplaced(map, key, pair, company);
    if (fault !== null) problems.push(fault);
    if (key === null || key.later === true) continue;
    const value = walk(key.shape, pair.value, { span: keySpan(pair), called: `\`${pair.key}\`` }, problems);
    found[pair.key] = fault === null ? value : null;
  }
  decide(map, home, first, problems);
  reportMissing(map, first, company, home, problems);
  const clash = map.check?.(found) ?? null;
  const blamed = clash === null ? undefined : first.get(clash.key);
  if (clash !== null && blamed !== undefined)
    problems.push(errorAt(blamed.value ?? keySpan(blamed), 'contradiction', clash.message));
  return found;
}

const keySpan = (pair: Pair) => ({ start: pair.keyStart, end: pair.keyEnd });

/** A declared key by its name; names such as `constructor` are not keys. */
export const keyOf = (map: Fields, name: string): Key | null =>
  Object.hasOwn(map.fields, name) ? (map.fields[name] ?? null) : null;

function firstOfEach(node: MapNode, map: Fields, problems: LocalProblem[]): ReadonlyMap<string, Pair> {
  const first = new Map<string, Pair>();
  for (const pair of node.pairs) {
    if (first.has(pair.key)) {
      problems.push(errorAt(keySpan(pair), 'duplicate-name', `\`${pair.key}\` stands twice in ${map.called}: only one can hold`));
    } else {
      first.set(pair.key, pair);
    }
  }
  return first;
}

/** What `with` asks for: the keys of a map, and the words among its values. */
interface Company {
  readonly has: ReadonlySet<string>;
  /** Whether a word or a deciding key is faulty or not computed yet, so that nothing can be said about what goes with it. */
  readonly unsettled: boolean;
}

function companyOf(map: Fields, first: ReadonlyMap<string, Pair>): Company {
  const has = new Set(first.keys());
  let unsettled = map.decidedBy?.some((name) => has.has(name) && keyOf(map, name)?.later === true) ?? false;
  for (const pair of first.values()) {
    const scalar = keyOf(map, pair.key)?.shape.scalar;
    if (scalar?.words === undefined || pair.value?.form !== 'scalar') continue;
    if (Object.hasOwn(scalar.words, pair.value.text)) has.add(pair.value.text);
    else unsettled = true;
  }
  return { has, unsettled: unsettled || (map.decidedBy?.every((name) => !has.has(name)) ?? false) };
}

const goes = (key: Key, company: Company) => key.with === undefined || key.with.some((other) => company.has.has(other));

function unknownKey(map: Fields, pair: Pair): LocalProblem {
  const known = Object.keys(map.fields);
  const meant = nearest(pair.key, known);
  const said = `\`${pair.key}\` is not a key of ${map.called}`;
  const offered = orList(known.filter((name) => map.fields[name]?.later !== true).map((name) => `\`${name}\``));
  const message = meant === null ? `${said}: it takes ${offered}` : `${said}; did you mean \`${meant}\`?`;
  return errorAt(keySpan(pair), 'unknown-key', message, meant === null ? [] : [writeInstead(keySpan(pair), meant)]);
}

function misplaced(map: Fields, key: Key, pair: Pair, company: Company): LocalProblem | null {
  if (key.later === true) return errorAt(keySpan(pair), 'unknown-key', `\`${pair.key}\` in ${map.called} is not supported yet`);
  if (company.unsettled) return null;
  const bar = key.notWith?.find((other) => company.has.has(other));
  if (bar !== undefined) return errorAt(keySpan(pair), 'contradiction', `\`${pair.key}\` cannot stand beside \`${bar}\``);
  if (key.with === undefined || goes(key, company)) return null;
  const others = orList(key.with.map((other) => `\`${other}\``));
  return errorAt(keySpan(pair), 'contradiction', `\`${pair.key}\` goes with ${others}, which does not stand here`);
}

/** Exactly one deciding key must stand. */
function decide(map: Fields, home: Home, first: ReadonlyMap<string, Pair>, problems: LocalProblem[]): void {
  if (map.decidedBy === undefined) return;
  const deciding = map.decidedBy.flatMap((name) => first.get(name) ?? []).sort((a, b) => a.keyStart - b.keyStart);
  const [one, second] = deciding;
  if (one === undefined) {
    const choices = orList(map.decidedBy.filter((name) => keyOf(map, name)?.later !== true).map((name) => `\`${name}\``));
    problems.push(errorAt(home.span, 'missing-key', `${map.called} needs ${choices}`));
  } else if (second !== undefined) {
    const message = `\`${second.key}\` cannot stand beside \`${one.key}\`: ${map.called} is one or the other`;
    problems.push(errorAt(keySpan(second), 'contradiction', message));
  }
}

function reportMissing(
  map: Fields,
  first: ReadonlyMap<string, Pair>,
  company: Company,
  home: Home,
  problems: LocalProblem[],
): void {
  if (map.completedBy !== undefined && first.has(map.completedBy)) return;
  for (const name of map.needed) {
    const key = first.has(name) ? null : keyOf(map, name);
    if (key === null || !isAskedFor(key, company)) continue;
    problems.push(errorAt(home.span, 'missing-key', `${home.called} needs \`${name}\`: ${lowerFirst(key.about)}`));
  }
}

function isAskedFor(key: Key, company: Company): boolean {
  if (key.requiredWith?.some((other) => company.has.has(other)) === true) return true;
  const barred = key.notWith?.some((other) => company.has.has(other)) ?? false;
  return key.required === true && !barred && goes(key, company);
}

const lowerFirst = (sentence: string) => sentence.charAt(0).toLowerCase() + sentence.slice(1).replace(/\.$/, '');
