/** The examples that come with the extension, opened as untitled copies so that nobody breaks the originals. */
import * as vscode from 'vscode';
import { languageId } from './specs';

/** An example to choose. */
export interface Example {
  readonly file: string;
  readonly label: string;
  readonly detail: string;
}

/** All examples; a test compares them with the folder. */
export const examples: readonly Example[] = [
  {
    file: 'gate-bearing.bandkeep.yaml',
    label: 'Sluice gate bearing',
    detail: 'Capture: a vibration pick-up beside a noisy drive. Everything passes.',
  },
  {
    file: 'gate-bearing-broken.bandkeep.yaml',
    label: 'Sluice gate bearing, broken',
    detail: 'The same with an alias and a flatness limit broken, to be cured by quick fixes.',
  },
  {
    file: 'fish-sounder.bandkeep.yaml',
    label: 'Fish sounder',
    detail: 'Generate: a held output, its copies, and the filter that keeps them down.',
  },
  {
    file: 'echo-receiver.bandkeep.yaml',
    label: 'Ice echo receiver',
    detail: 'Capture: an intermediate frequency of 4.2 to 4.5 MHz sampled near 1 MHz, whole and the right way round.',
  },
  {
    file: 'strain-link.bandkeep.yaml',
    label: 'Strain link',
    detail: 'Relay: strain across a rotating shaft by pulses, time slots, and one resistor and one capacitor on each side.',
  },
  {
    file: 'standards/bt601-video.bandkeep.yaml',
    label: 'Component video',
    detail: 'Masks: the filter templates of ITU-R BT.601, and filters that meet them.',
  },
  {
    file: 'standards/g712-speech.bandkeep.yaml',
    label: 'Speech at 8 kHz',
    detail: 'Masks: loss, image and roll-off of ITU-T G.712, and filters that meet them.',
  },
  {
    file: 'standards/aes17-measurement.bandkeep.yaml',
    label: 'Audio measurement low-pass',
    detail: 'Masks: the measurement filter of AES17, and a filter that meets it.',
  },
];

/** Lets the reader choose an example and opens a copy of it. */
export async function openExample(extensionUri: vscode.Uri): Promise<void> {
  const chosen = await vscode.window.showQuickPick(examples, { placeHolder: 'Which example?', matchOnDetail: true });
  if (chosen === undefined) return;
  const bytes = await vscode.workspace.fs.readFile(vscode.Uri.joinPath(extensionUri, 'examples', chosen.file));
  const content = new TextDecoder().decode(bytes);
  const document = await vscode.workspace.openTextDocument({ language: languageId, content });
  await vscode.window.showTextDocument(document);
}
