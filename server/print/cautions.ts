/** Where people get hurt, or something irreplaceable is fed by mistake. Common practice, no source. */
export const handlingCautions = [
  'Lifting: bend your knees, hold the box close, and split or share a heavy one.',
  'Dust, mould, droppings: open a window, wear gloves and a mask. Look out for sharp things.',
  'Shredder: keep fingers, hair, ties, scarves, children and pets away, and unplug it before you clear a jam.',
  'Take staples and clips out of what is fed. Never force a bundle in.',
  'Never unclip or feed a will, a deed, a passport or a photograph. If one turns up, stop and keep it back.',
] as const;

export const generalGuidance =
  'General guidance: local law decides. Ask the accountant or solicitor before destroying tax, legal or property papers.';

/** Cautions of a list and those that always hold, each once. */
export function gatherCautions(own: readonly string[]): string[] {
  const seen = new Set<string>();
  return [...handlingCautions, ...own].filter((sentence) => {
    const key = sentence.trim().toLowerCase();
    if (key === '' || seen.has(key)) return false;
    seen.add(key);
    return true;
  });
}
