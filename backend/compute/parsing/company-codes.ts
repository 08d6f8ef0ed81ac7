import type { ReadingTerms } from './reading-terms';

/** Numbers companies in the order of their first appearance. */
export class CompanyCodes {
  /** Names by code. */
  readonly companies: string[] = [];
  /** Month in which a company's fiscal year ends where the text does not say, by code. */
  readonly endMonths: number[] = [];
  readonly #terms: ReadingTerms;
  readonly #monthOf: ReadonlyMap<string, number>;
  readonly #byText = new Map<string, number>();
  readonly #byName = new Map<string, number>();

  constructor(terms: ReadingTerms) {
    this.#terms = terms;
    this.#monthOf = new Map(
      terms.fiscalYears.companies.map(({ company, endMonth }) => [
        terms.companyOf(company),
        endMonth,
      ]),
    );
  }

  codeOf(text: string): number {
    const known = this.#byText.get(text);
    if (known !== undefined) return known;
    const name = this.#terms.companyOf(text);
    const code = this.#byName.get(name) ?? this.#add(name);
    this.#byText.set(text, code);
    return code;
  }

  #add(name: string): number {
    const code = this.companies.length;
    this.companies.push(name);
    this.endMonths.push(this.#monthOf.get(name) ?? this.#terms.fiscalYears.usualEndMonth);
    this.#byName.set(name, code);
    return code;
  }
}
