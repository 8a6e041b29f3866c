/** Names within one list must differ, since messages and plots tell its items apart by them. */
import type { Report } from './report';

/** Adds a fault for every name that stands a second time; names are compared as written. */
export function reportRepeatedNames(
  items: readonly ({ readonly name?: string | null } | null)[],
  list: string,
  report: Report,
): void {
  const seen = new Set<string>();
  items.forEach((item, index) => {
    const name = item?.name;
    if (typeof name !== 'string') return;
    if (seen.has(name)) report.fault([list, index, 'name'], 'duplicate-name', `the name \`${name}\` stands twice in \`${list}\``);
    seen.add(name);
  });
}
