import { insideInformationCaution } from '../contract';
import { type Letter, type LetterPlace, oneLine } from './letter';

/** What a mail about an edition may say: no figure of it, no comment, nothing that may be inside information. */
export interface EditionNews {
  readonly editionId: string;
  readonly number: number;
  /** Who published, signed or returned it. */
  readonly by: string;
}

export function editionWaiting({ editionId, number, by }: EditionNews, place: LetterPlace): Letter {
  const workspace = oneLine(place.workspaceName);
  return about(editionId, number, place, {
    subject: `Edition ${number} waits for your decision (${workspace})`,
    paragraph: `${oneLine(by)} published edition ${number} in ${workspace}. It waits for you to sign it or to return it.`,
    why: `You get this mail as CFO in ${workspace}.`,
  });
}

export function editionSigned({ editionId, number, by }: EditionNews, place: LetterPlace): Letter {
  const workspace = oneLine(place.workspaceName);
  return about(editionId, number, place, {
    subject: `Edition ${number} is signed (${workspace})`,
    paragraph: `${oneLine(by)} signed edition ${number} in ${workspace}.`,
    why: `You get this mail because you published edition ${number}.`,
  });
}

export function editionReturned(
  { editionId, number, by }: EditionNews,
  place: LetterPlace,
): Letter {
  const workspace = oneLine(place.workspaceName);
  return about(editionId, number, place, {
    subject: `Edition ${number} is returned (${workspace})`,
    paragraph: `${oneLine(by)} returned edition ${number} in ${workspace}. The reason stands on its page.`,
    why: `You get this mail because you published edition ${number}.`,
  });
}

function about(
  editionId: string,
  number: number,
  place: LetterPlace,
  words: { readonly subject: string; readonly paragraph: string; readonly why: string },
): Letter {
  return {
    subject: words.subject,
    paragraphs: [words.paragraph],
    link: { words: `Open edition ${number}`, address: `${place.publicOrigin}/board/${editionId}` },
    closing: [
      'This mail holds no figures: they are on the page, for those who may see them.',
      insideInformationCaution,
      words.why,
    ],
  };
}
