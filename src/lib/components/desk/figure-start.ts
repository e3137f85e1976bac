/** A figure to begin with, as the block that stands in a lesson. @param id that no figure of the lesson has */
export const figureStart = (id: string): string => `\`\`\`figure
id: ${id}
caption: Say in one sentence what turning the resolution shows.
receiver: field
scene:
  emitters:
    - { kind: cw, frequencyHz: 450.0125e6, levelDbm: -20 }
    - { kind: cw, frequencyHz: 450.0375e6, levelDbm: -50 }
settings:
  centreHz: 450.025e6
  spanHz: 100000
  rbwHz: 1000
  points: 1001
  referenceDbm: -10
seed: 1
controls:
  - { setting: rbwHz, label: Resolution, choices: [300, 1000, 3000] }
readings:
  - { kind: peak }
\`\`\`
`;

/** "figure-3": the first such name that the text doesn't have. */
export function freeFigureId(text: string): string {
	let n = 1;
	while (new RegExp(`^id: figure-${n}$`, 'm').test(text)) n++;
	return `figure-${n}`;
}
