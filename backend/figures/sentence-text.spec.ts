import { type SentencePart, sentenceText } from './sentence-text';

const money = (value: number, digits: number, isSize = false): SentencePart => ({
  figure: 'standing',
  kind: 'money',
  value,
  digits,
  isSize,
});

describe('sentenceText', () => {
  const sentence: readonly SentencePart[] = [
    { own: 'Velmara' },
    { text: ' lies ' },
    money(-2407.02, -1, true),
    { text: ' ' },
    { unit: true },
    { text: ' below its peers' },
  ];

  it('keeps the significant digits in every unit', () => {
    const setting = { currency: 'EUR', panelUnit: 'millions' } as const;
    expect(sentenceText(sentence, { ...setting, unit: 'millions' })).toBe(
      'Velmara lies 2,410 EUR m below its peers',
    );
    expect(sentenceText(sentence, { ...setting, unit: 'billions' })).toBe(
      'Velmara lies 2.41 EUR bn below its peers',
    );
    expect(sentenceText(sentence, { ...setting, unit: 'thousands' })).toBe(
      'Velmara lies 2,410,000 EUR k below its peers',
    );
  });

  it('writes shares in percent, counts and slopes as they are, and signs with a minus', () => {
    const parts: readonly SentencePart[] = [
      { figure: null, kind: 'percent', value: 0.6204, digits: 1, isSize: false },
      { text: ', ' },
      { figure: 'slope.0', kind: 'plain', value: -0.508, digits: 3, isSize: false },
      { text: ', ' },
      { figure: null, kind: 'count', value: 12, digits: 0, isSize: false },
    ];
    const text = sentenceText(parts, { currency: 'EUR', panelUnit: 'millions', unit: 'billions' });
    expect(text).toBe('62.0 %, −0.508, 12');
  });
});
