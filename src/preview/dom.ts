/** Makes elements from data: text only ever through `textContent`, so nothing from a spec can become markup. */

/** What an element is made with. */
export interface ElementOptions {
  readonly class?: string;
  readonly text?: string;
  readonly attributes?: Readonly<Record<string, string>>;
}

/** A new element with its children. */
export function element<Tag extends keyof HTMLElementTagNameMap>(
  tag: Tag,
  options: ElementOptions = {},
  ...children: readonly Node[]
): HTMLElementTagNameMap[Tag] {
  const made = document.createElement(tag);
  if (options.class !== undefined) made.className = options.class;
  if (options.text !== undefined) made.textContent = options.text;
  for (const [name, value] of Object.entries(options.attributes ?? {})) made.setAttribute(name, value);
  made.append(...children);
  return made;
}

/** A button that says what it does and does it. */
export function button(text: string, title: string, press: () => void): HTMLButtonElement {
  const made = element('button', { text, attributes: { type: 'button', title } });
  made.addEventListener('click', press);
  return made;
}

/** Sets an element's text only where it differs, so that nothing is announced or repainted in vain. */
export function setText(target: HTMLElement, text: string): void {
  if (target.textContent !== text) target.textContent = text;
}

/** The element with an id that the page's own markup holds. */
export function byId(id: string): HTMLElement {
  const found = document.getElementById(id);
  if (found === null) throw new Error(`the page has no element \`${id}\``);
  return found;
}

/** Fills a container anew and gives the focus back to the element with the same `data-key`, if it was inside. */
export function keepingFocus(container: HTMLElement, fill: () => void): void {
  const active = container.contains(document.activeElement) ? document.activeElement : null;
  const key = active instanceof HTMLElement ? active.dataset['key'] : undefined;
  fill();
  if (key === undefined) return;
  const again = Array.from(container.querySelectorAll<HTMLElement>('[data-key]')).find((child) => child.dataset['key'] === key);
  again?.focus({ preventScroll: true });
}
