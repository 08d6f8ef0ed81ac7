import type { XmlHandler } from './read-xml';
import { unescapeText } from './unescape-text';

/** Collects the texts that a workbook's cells share; runs of formatted text are joined, reading aids left out. */
export class SharedStrings implements XmlHandler {
  readonly texts: string[] = [];
  #item = '';
  #isInText = false;
  #isInPhonetic = false;

  readonly open = (name: string): void => {
    if (name === 'si') this.#item = '';
    else if (name === 'rPh') this.#isInPhonetic = true;
    else if (name === 't') this.#isInText = !this.#isInPhonetic;
  };

  readonly text = (text: string): void => {
    if (this.#isInText) this.#item += text;
  };

  readonly close = (name: string): void => {
    if (name === 't') this.#isInText = false;
    else if (name === 'rPh') this.#isInPhonetic = false;
    else if (name === 'si') this.texts.push(unescapeText(this.#item));
  };
}
