const WORDS: readonly (readonly [RegExp, string])[] = [
  [/\bmaxCamberPosition\b/g, 'camber position'],
  [/\bmaxCamber\b/g, 'camber'],
  [/\bmaxThickness\b/g, 'thickness'],
  [/\btrailingEdgeGap\b/g, 'trailing-edge gap'],
  [/\btrailingEdge\b/g, 'trailing edge'],
];

/** The sentence of a refused shape with the trade's words for its fields, for the screen. */
export function shapeSentence(message: string): string {
  const words = WORDS.reduce((text, [field, word]) => text.replace(field, word), message);
  const sentence = words.charAt(0).toUpperCase() + words.slice(1);
  return /[.!?]$/.test(sentence) ? sentence : `${sentence}.`;
}
