/** One line that stands beside every standing, scenario and edition. */
export const shortCaution =
  'Statistical associations, not causes. No appraisal, fairness opinion, investment advice or share price forecast. May be inside information.';

/** Also stands where there is no figure of a fit, only the panel. */
export const insideInformationCaution =
  'Unpublished figures may be inside information: share them only with those allowed to have them, and ask counsel before any outside use.';

/** The cautions in full: in every edition and export, and one step from every standing and scenario. */
export const cautions: readonly string[] = [
  'The figures are statistical associations, not causes: they say where companies with such capex and book equity have been valued, not what a plan will do.',
  'They are no appraisal, fairness opinion, investment advice or forecast of the share price.',
  'Valuations for reporting, tax or transactions are for licensed practitioners under the standards that apply to them, and local rules prevail.',
  insideInformationCaution,
];
