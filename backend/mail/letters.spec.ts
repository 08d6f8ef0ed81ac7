import { insideInformationCaution } from '../contract';
import { letterHtml, letterText } from './letter';
import { type LetterName, writeLetter } from './letters';
import { pauseMinutes } from './mail-job';

const place = { workspaceName: 'Velmara & "Sons"', publicOrigin: 'https://kinvale.example' };
const news = { editionId: 'e-1', number: 3, by: '<img src=x onerror=alert(1)>' };
const names: readonly LetterName[] = ['edition-waiting', 'edition-signed', 'edition-returned'];

describe('letters about an edition', () => {
  it('say who did what to which edition, in text and in HTML', () => {
    const firstLines = names.map((name) => {
      const letter = writeLetter(name, { ...news, by: 'Ana' }, place);
      expect(letterHtml(letter)).toContain('Ana ');
      return letterText(letter).split('\n')[0];
    });
    expect(firstLines).toEqual([
      'Ana published edition 3 in Velmara & "Sons". It waits for you to sign it or to return it.',
      'Ana signed edition 3 in Velmara & "Sons".',
      'Ana returned edition 3 in Velmara & "Sons". The reason stands on its page.',
    ]);
  });

  for (const name of names) {
    it(`link to the page and warn of inside information (${name})`, () => {
      const letter = writeLetter(name, news, place);
      for (const form of [letterText(letter), letterHtml(letter)]) {
        expect(form).toContain('https://kinvale.example/board/e-1');
        expect(form).toContain(insideInformationCaution);
      }
    });

    it(`hold no number but the edition's own (${name})`, () => {
      const { subject, paragraphs, closing } = writeLetter(name, { ...news, by: 'Ana' }, place);
      const numbers = [subject, ...paragraphs, ...closing].join(' ').match(/\d+/g);
      expect(new Set(numbers)).toEqual(new Set(['3']));
    });

    it(`tell nothing of what else was kept with them (${name})`, () => {
      const letter = writeLetter(name, { ...news, comment: 'secret', value: 2407.02 }, place);
      expect(letterText(letter) + letterHtml(letter) + letter.subject).not.toMatch(/secret|2407/);
    });

    it(`escape names (${name})`, () => {
      const html = letterHtml(writeLetter(name, news, place));
      expect(html).not.toContain('<img');
      expect(html).toContain('&lt;img src=x onerror=alert(1)&gt;');
      expect(html).toContain('Velmara &amp; &quot;Sons&quot;');
    });

    it(`keep a name on its line (${name})`, () => {
      const by = 'Ana\r\n\r\nSigned:\u2028nobody\u0000';
      const split = { workspaceName: 'A\r\nBcc: x@velmara.example', publicOrigin: 'https://k' };
      const letter = writeLetter(name, { ...news, by }, split);
      expect(letter.subject).toMatch(/^Edition 3 .*\(A Bcc: x@velmara\.example\)$/);
      expect(letterText(letter)).toContain('Ana Signed: nobody ');
    });
  }

  it('are known by name alone', () => {
    expect(() => writeLetter('toString', news, place)).toThrowError(/no letter/);
  });
});

describe('the pauses of a mail that is put off', () => {
  it('grow with each job of five tries, up to an hour', () => {
    const minutes = [1, 5, 9, 10, 15, 20, 35, 40, 400].map(pauseMinutes);
    expect(minutes).toEqual([1, 1, 1, 4, 9, 16, 49, 60, 60]);
  });
});
