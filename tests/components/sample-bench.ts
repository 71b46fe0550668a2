/** Everything of the named kinds that an element lets out, with its detail. */
export function recordEvents(
  element: EventTarget,
  types: readonly string[],
): { readonly type: string; readonly detail: unknown }[] {
  const told: { type: string; detail: unknown }[] = [];
  for (const type of types) {
    element.addEventListener(type, (event) =>
      told.push({ type, detail: (event as CustomEvent).detail ?? undefined }),
    );
  }
  return told;
}
