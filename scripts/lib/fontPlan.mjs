/** The faces that ship: two of Brygada 1918 for headings and figures, with their italics; Source Sans 3 for the rest. */
const brygada = (weight, italic, folder, file, preload) => ({
  family: 'Brygada 1918', name: `B${weight}${italic ? 'i' : ''}`, weight, style: italic ? 'italic' : 'normal', file: ['brygada-1918', folder, file], preload,
});
const source = (weight, italic, folder, file, preload) => ({
  family: 'Source Sans 3', name: `S${weight}${italic ? 'i' : ''}`, weight, style: italic ? 'italic' : 'normal', file: ['source-sans-3', folder, file], preload,
});

export const FONTS = [
  brygada(500, false, '500Medium', 'Brygada1918_500Medium.ttf', false),
  brygada(600, false, '600SemiBold', 'Brygada1918_600SemiBold.ttf', true),
  brygada(500, true, '500Medium_Italic', 'Brygada1918_500Medium_Italic.ttf', false),
  brygada(600, true, '600SemiBold_Italic', 'Brygada1918_600SemiBold_Italic.ttf', false),
  source(400, false, '400Regular', 'SourceSans3_400Regular.ttf', true),
  source(400, true, '400Regular_Italic', 'SourceSans3_400Regular_Italic.ttf', false),
  source(600, false, '600SemiBold', 'SourceSans3_600SemiBold.ttf', false),
  source(700, false, '700Bold', 'SourceSans3_700Bold.ttf', false),
];

const range = (from, to) => Array.from({ length: to - from + 1 }, (_, i) => String.fromCodePoint(from + i)).join('');

const TEXT = [
  range(0x20, 0x7e), range(0xa0, 0x17f), // Latin, Latin-1, Latin Extended-A
  range(0x370, 0x3ff), // Greek
  range(0x2010, 0x2015), '‘’‚“”„•…′″‹›€™', '\u2007\u2009\u200a\u202f\u2011',
  range(0x2070, 0x209c), // raised and lowered figures
  '−±×÷·∙≤≥≈≠≡∞∼√∂∆∑∏∫←→↑↓↔⇌⇒⇔⟨⟩‰ℓᵃᵇ', '½¼¾⅓⅔⅛', '℃Å',
  '■□●○◆◇▲△▸▾▴◂▪▫★☆✓✗',
].join('');

// These are drawn at one weight only in Brygada 1918, too light for its headings; left out, the browser takes them from
// Source Sans 3 at the right weight. Digits and letters do gain weight.
const ONE_WEIGHT_IN_BRYGADA = new Set('#()+/=[\\]{|}~¦¬±×÷‒—―‖₍₎←→↑↓↔−∞≈≠⟨⟩');

/** The characters a family is asked for; those the font does not draw fall away when its subset is made. */
export function wantedText(family) {
  const characters = new Set(TEXT);
  return new Set([...characters].filter((character) => !(family === 'Brygada 1918' && ONE_WEIGHT_IN_BRYGADA.has(character))));
}
