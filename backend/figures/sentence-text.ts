import { type MoneyUnit, fixedText, unitRatio, unitText } from './number-text';

/** A number within a sentence; `digits` after the point where the unit is the panel's. See the contract's figure. */
export interface WrittenFigure {
  readonly figure: string | null;
  readonly kind: 'money' | 'percent' | 'plain' | 'count';
  readonly value: number;
  readonly digits: number;
  readonly isSize: boolean;
}

/** Words, the unit, the own company's name and figures, in the order they are read. */
export type SentencePart =
  { readonly text: string } | { readonly unit: true } | { readonly own: string } | WrittenFigure;

/** In which unit a sentence is written. */
export interface SentenceSetting {
  readonly currency: string;
  readonly panelUnit: MoneyUnit;
  readonly unit: MoneyUnit;
  readonly locale?: string;
}

/** One part as it is read: `2,407`, `EUR m`, `62.0 %`. Money keeps its significant digits in every unit. */
export function sentencePartText(part: SentencePart, setting: SentenceSetting): string {
  if ('text' in part) return part.text;
  if ('own' in part) return part.own;
  if ('unit' in part) return unitText(setting.currency, setting.unit);
  const value = part.isSize ? Math.abs(part.value) : part.value;
  if (part.kind === 'percent') return `${fixedText(value * 100, part.digits, setting.locale)} %`;
  if (part.kind !== 'money') return fixedText(value, part.digits, setting.locale);
  const ratio = unitRatio(setting.panelUnit, setting.unit);
  const digits = part.digits - Math.round(Math.log10(ratio));
  return fixedText(value * ratio, digits, setting.locale);
}

/** The whole sentence. */
export function sentenceText(sentence: readonly SentencePart[], setting: SentenceSetting): string {
  return sentence.map((part) => sentencePartText(part, setting)).join('');
}
