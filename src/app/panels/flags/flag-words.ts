import type { Flag } from '@panel-data';
import type { NumberFormat } from '../../ui/number-format';
import { counted } from '../../ui/phrases';

/** `Kesdrin FY2016 capex`, as a flag's cell is called. */
export function flagPlace({ company, year, column }: Flag, titles: readonly string[]): string {
  return `${company} FY${year}${column === null ? '' : ` ${variableName(titles[column])}`}`;
}

/** What is the matter with the cell, in words and figures; money in the unit that is shown. */
export function flagReason(flag: Flag, numbers: NumberFormat): string {
  const { facts, value } = flag;
  const money = (amount: number): string => numbers.figure(amount);
  const ratio = (times: number): string => numbers.headline(times, 'plain');
  switch (facts.code) {
    case 'missing':
      return 'is missing';
    case 'duplicate': {
      const others = facts.more === 0 ? '' : ` and ${counted(facts.more, 'more', 'more')}`;
      if (facts.of === 'name')
        return `may be the same company as “${facts.company}”${others}: nearly the same name, and years that overlap or follow on`;
      const row = facts.columns > 1 ? `, as are ${facts.columns} of this row` : '';
      return `the figure of ${facts.company}${others} in the same year${row}`;
    }
    case 'sign':
      return value === 0 ? 'is zero' : 'is negative';
    case 'unit-slip': {
      const factor = facts.factor.toLocaleString('en');
      const size = facts.isTooLarge ? `${factor} times` : `one ${factor}th of`;
      return facts.against === 'own-years'
        ? `about ${size} its usual ${money(facts.usual)}`
        : `about ${size} what the company’s other figures suggest`;
    }
    case 'stale-copy':
      return facts.columns > 1
        ? `the figure of the year before, as are ${facts.columns} of this row`
        : 'the figure of the year before, digit by digit';
    case 'jump':
      return `${ratio(facts.ratio)} times the year before (${money(facts.before)}); its usual change is ${ratio(facts.usualRatio)} times`;
    case 'peer-outlier':
      return `${ratio(facts.ratio)} times its book equity; ${counted(facts.peers, 'other company', 'other companies')} of that year lie around ${ratio(facts.usualRatio)}`;
    case 'year-gap':
      return 'has no row, between years that have one';
  }
}

/** `4,120`; empty where there is none, or nothing but its absence to tell. */
export function flagFigure({ value, facts }: Flag, numbers: NumberFormat): string {
  return value === null || (facts.code === 'sign' && value === 0) ? '' : numbers.figure(value);
}

/** The whole in one line: `Kesdrin FY2016 capex 4,120: 9.8 times the year before…`. */
export function flagLine(flag: Flag, titles: readonly string[], numbers: NumberFormat): string {
  const figure = flagFigure(flag, numbers);
  const cell = `${flagPlace(flag, titles)}${figure === '' ? '' : ` ${figure}`}`;
  const reason = flagReason(flag, numbers);
  return /^(is|has|may) /.test(reason) ? `${cell} ${reason}` : `${cell}: ${reason}`;
}

/** `book equity` within a sentence; the header of a further column stays as it is written. */
function variableName(title: string): string {
  return ['Market value', 'Capex', 'Book equity'].includes(title) ? title.toLowerCase() : title;
}
