/** Text to findings for whole files and for one edit, beside the bare `yaml` parse of the same text. */
import { parseDocument } from 'yaml';

import { createJudgeStore, judge } from '../../src/findings';
import { read } from '../../src/spec';
import { medians, report } from './ratio';
import { editedText, specText } from './spec-text';

const channels = 1000;

/** Runs and prints. */
export function benchReading(): void {
  whole('whole file, one band source a channel', specText(channels), 1.4, 0.25);
  whole('whole file, tones only', specText(channels, { tonesOnly: true }), 1.4, 0.05);
  oneEdit();
}

function whole(what: string, text: string, goal: number, judgementGoal: number): void {
  const reading = read(text);
  const times = medians({
    parse: () => parseDocument(text, { uniqueKeys: false }),
    all: () => judge(read(text), createJudgeStore()),
    judged: () => judge(reading, createJudgeStore()),
  });
  const parsed = `(yaml ${times.parse.toFixed(0)} ms)`;
  report(`${what}: text to findings / yaml`, times.all / times.parse, goal, parsed);
  report(`${what}: analysis and judgement / yaml`, times.judged / times.parse, judgementGoal, parsed);
}

function oneEdit(): void {
  const text = specText(channels);
  const store = createJudgeStore();
  let reading = read(text);
  judge(reading, store);
  const times = medians(
    {
      parse: () => parseDocument(text, { uniqueKeys: false }),
      edit: (round) => {
        reading = read(editedText(text, channels, round), reading);
        judge(reading, store);
      },
    },
    15,
  );
  report(`one edit in 1 of ${String(channels)} channels / yaml`, times.edit / times.parse, 0.01, `(${times.edit.toFixed(2)} ms)`);
}
