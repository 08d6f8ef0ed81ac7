import { csvLines, inventedRows } from './invented-figures';

const industries = ['Pumps', 'Valves', 'Seals'];
const countries = ['Denmark', 'Austria', 'Portugal', 'Finland'];

/** An own company and 60 others, with the industry and country of each. */
export function candidateLines(own: string): readonly string[] {
  const names = [
    own,
    ...Array.from({ length: 60 }, (_, place) => `Candidate ${String(place + 1).padStart(2, '0')}`),
  ];
  const [header, ...lines] = csvLines(inventedRows(names, 2016, 8));
  return [
    `${header},Industry,Country`,
    ...lines.map((line) => {
      const place = names.indexOf(line.slice(0, line.indexOf(',')));
      return `${line},${industryOf(place)},${countryOf(place)}`;
    }),
  ];
}

function industryOf(place: number): string {
  return industries[place % industries.length];
}

function countryOf(place: number): string {
  return countries[place % countries.length];
}
