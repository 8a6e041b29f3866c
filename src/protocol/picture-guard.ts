/** Whether an unknown value is a picture that can be drawn without further checks. */
import { isFiniteNumber, isListOf, isNullOr, isPlaceName, isRecord, isText } from './guards';
import type { Item, Label, LevelUnit, PanelPicture, Pane, Plot, Points, Role, Row, Section, Series, Shape } from './picture';

const units: readonly LevelUnit[] = ['dBFS', 'dB', 'deg', 's', 'ms', 'µs', 'ns'];

const roles: readonly Role[] = [
  'wanted',
  'source',
  'landing',
  'harm',
  'copy',
  'path',
  'total',
  'stage',
  'pulse',
  'envelope',
  'limit',
  'noise',
  'rule',
];

/** Checks every number, text and reference of a picture; an unknown kind of shape is refused. */
export function isPicture(value: unknown): value is PanelPicture {
  if (!isRecord(value) || !isText(value['channel']) || !isRecord(value['heading'])) return false;
  const heading = value['heading'];
  if (!isText(heading['summary']) || !isText(heading['words']) || !isAnswer(heading['verdict'])) return false;
  return isListOf(value['sections'], isSection);
}

function isAnswer(value: unknown): boolean {
  return isRecord(value) && isText(value['text']) && isOneOf(value['standing'], ['passes', 'thin', 'over', 'unjudged']);
}

function isSection(value: unknown): value is Section {
  if (!isRecord(value) || !isOneOf(value['id'], ['sampling', 'leaving', 'path'])) return false;
  if (!isText(value['title']) || !isAnswer(value['answer']) || !isNullOr(value['place'], isPlaceName)) return false;
  return isListOf(value['plots'], isPlot);
}

function isPlot(value: unknown): value is Plot {
  if (!isRecord(value) || ![value['id'], value['title'], value['words']].every(isText)) return false;
  if (!isOneOf(value['shown'], ['always', 'on demand'])) return false;
  if (!isListOf(value['panes'], isPane) || !isListOf(value['series'], isSeries) || !isListOf(value['items'], isItem))
    return false;
  const panes = new Set(value['panes'].map((pane) => pane.id));
  return panes.size > 0 && value['items'].every((item) => panes.has(item.pane)) && isTable(value['table']);
}

function isPane(value: unknown): value is Pane {
  if (!isRecord(value) || !isText(value['id']) || !isRecord(value['x']) || !isRecord(value['y'])) return false;
  const { x, y } = value;
  const titles = isText(x['title']) && isText(y['title']) && isOneOf(x['scale'], ['log', 'linear']) && isOneOf(y['unit'], units);
  return titles && isRising(x['lowHz'], x['highHz']) && isRising(0, x['logLowHz']) && isRising(y['low'], y['high']);
}

function isSeries(value: unknown): value is Series {
  if (!isRecord(value) || !isOneOf(value['role'], roles)) return false;
  return isText(value['id']) && isText(value['name']) && isNullOr(value['place'], isPlaceName);
}

function isItem(value: unknown): value is Item {
  if (!isRecord(value)) return false;
  const texts = [value['id'], value['series'], value['pane'], value['name'], value['words']];
  if (
    !texts.every(isText) ||
    !isOneOf(value['role'], roles) ||
    !isNullOr(value['place'], isPlaceName) ||
    !isListOf(value['joins'], isText)
  )
    return false;
  return isListOf(value['shapes'], isShape) && isNullOr(value['label'], isLabel);
}

function isShape(value: unknown): value is Shape {
  if (!isRecord(value)) return false;
  const numbers = (...keys: string[]): boolean => keys.every((key) => isFiniteNumber(value[key]));
  switch (value['kind']) {
    case 'curve':
      return isPoints(value['points']);
    case 'area':
      return isPoints(value['upper']) && isNullOr(value['lower'], isPoints);
    case 'block':
      return numbers('lowHz', 'highHz', 'top');
    case 'stem':
      return numbers('frequencyHz', 'top');
    case 'rule':
      return numbers('frequencyHz');
    case 'forbidden':
      return isPoints(value['boundary']) && isOneOf(value['side'], ['above', 'below']);
    case 'mark':
      return numbers('frequencyHz', 'level');
    case 'ribbon':
      return isText(value['landsPane']) && numbers('lowHz', 'highHz', 'landsLowHz', 'landsHighHz', 'strength');
    default:
      return false;
  }
}

function isPoints(value: unknown): value is Points {
  if (!isRecord(value) || !isListOf(value['x'], isFiniteNumber) || !isListOf(value['y'], isFiniteNumber)) return false;
  const from = value['from'];
  return value['x'].length === value['y'].length && (from === undefined || isListOf(from, isFiniteNumber));
}

function isLabel(value: unknown): value is Label {
  return (
    isRecord(value) && isText(value['text']) && [value['frequencyHz'], value['level'], value['priority']].every(isFiniteNumber)
  );
}

function isTable(value: unknown): boolean {
  if (!isRecord(value) || !isText(value['caption']) || !isListOf(value['rows'], isRow)) return false;
  return isListOf(value['columns'], (column): column is Record<string, unknown> => isRecord(column) && isText(column['title']));
}

function isRow(value: unknown): value is Row {
  const isCell = (cell: unknown): cell is string | number | null => cell === null || isText(cell) || isFiniteNumber(cell);
  return isRecord(value) && isNullOr(value['item'], isText) && isListOf(value['cells'], isCell);
}

function isOneOf(value: unknown, words: readonly string[]): boolean {
  return isText(value) && words.includes(value);
}

function isRising(low: unknown, high: unknown): boolean {
  return isFiniteNumber(low) && isFiniteNumber(high) && low < high;
}
