import type { ReplicationPack } from './replication-pack';

/** What each file is and how to run the script. */
export function readmeText(pack: ReplicationPack): string {
  const { result, ownCompany, evidence, lineage } = pack;
  const { specification, sample } = result;
  const isLagged = specification.lag === 1;
  return `Replication pack of fit ${result.hash}
Engine ${result.engine}; own company: ${ownCompany ?? 'none'}

rows.csv      The ${sample.observations + sample.singleRow.length} rows that went into the fit, by company and year: company, year, outcome, regressors
              (${isLagged ? 'each of the fiscal year before, as the fit takes them' : 'of the same fiscal year'}), in the panel's measure (${specification.form === 'log' ? 'logarithms are taken later' : 'no logarithms'}).
              "file row" is the line of the imported file, its header being line 1. "used" is "no" for a
              company with one complete row: it has an intercept and no part in any other figure.
              UTF-8, RFC 4180, decimal point, every number at full precision. A text that begins with
              = + - @, a tab, a line end or an apostrophe before one of them has one apostrophe before it
              that is not part of the text: spreadsheets then compute nothing from it.
results.json  The specification and every figure of the fit at full precision; null with a reason beside it
              where a figure is not defined.
schema.json   JSON Schema of results.json${evidence === null ? '' : ' and of evidence.json'}.
${evidenceText(pack)}${lineage === null ? '' : 'lineage.json  Where the fit comes from: peer group version with its reasons, panel version, imported file.\n'}CAUTIONS.txt  What the figures are and what they are not. Read it before passing anything on.
replication.R Computes slopes, their covariance, intercepts, poolability and the interval of the standing again from
              rows.csv and prints the largest difference to results.json.

To run it, with R and the packages that the first lines of replication.R name, in the folder of these files:

    Rscript replication.R
`;
}

/** What evidence.json is, with what its bootstrap started from; or why it is not there. */
function evidenceText({ evidence, evidenceReason }: ReplicationPack): string {
  if (evidence === null)
    return evidenceReason === undefined
      ? ''
      : `evidence.json is not in this pack. ${evidenceReason}\n`;
  const text =
    'evidence.json What speaks for and against the fit: other estimators, all intervals, tests, residuals.\n';
  const drawn = evidence.covariances.find(({ draws }) => draws !== undefined);
  if (drawn === undefined) return text;
  return `${text}              Its intervals "${drawn.code}" are of ${drawn.draws} random draws with seed ${drawn.seed}.\n`;
}
