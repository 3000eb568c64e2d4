/** Paths of findings that belong to another field of the form than their own. */
const ELSEWHERE: readonly (readonly [RegExp, string])[] = [
  [/^machine(\..*)?$/, 'machineId'],
  [/^material(\..*)?$/, 'materialId'],
  [/^panel\.(root|tip)\.shape.*/, 'panel.$1.sectionId'],
  [/^panel\.(root|tip)$/, 'panel.$1.chordMm'],
  [/^block$/, 'block.lengthMm'],
  [/^ribs\.stations\.mm.*/, 'ribs.stations.mm'],
  [/^ribs\.stations$/, 'ribs.stations.count'],
  [/^inspection\.stations.*/, 'inspection.stations'],
];

/** The field of the form that a path of a finding or of a refusal belongs to. */
export function fieldOf(path: string): string {
  const found = ELSEWHERE.find(([pattern]) => pattern.test(path));
  return found ? path.replace(...found) : path;
}

/** Focuses the field of a path, opening what it is folded into. Where there is none, the nearest around it; false when there is nothing. */
export function focusPath(form: HTMLElement, path: string): boolean {
  const named = [...form.querySelectorAll<HTMLElement>('[name]')];
  const nameOf = (element: HTMLElement) => element.getAttribute('name') ?? '';
  for (
    let wanted = fieldOf(path);
    wanted !== '';
    wanted = wanted.slice(0, Math.max(0, wanted.lastIndexOf('.')))
  ) {
    const field =
      named.find((element) => nameOf(element) === wanted) ??
      named.find((element) => nameOf(element).startsWith(`${wanted}.`));
    if (!field) continue;
    for (let fold = field.closest('details'); fold; fold = fold.parentElement?.closest('details') ?? null)
      fold.open = true;
    field.focus();
    field.scrollIntoView({ block: 'nearest' });
    return true;
  }
  return false;
}
