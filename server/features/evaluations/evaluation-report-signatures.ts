import type { Evaluation, Signature } from '@shared/model/evaluations';
import type { Settings } from '@shared/model/settings';
import { siteDate, siteInstant } from '@shared/text/site-time';
import type { Content } from 'pdfmake/interfaces';

import { sectionHead, STOP } from '../../pdf/document-parts';

const MEANINGS: Readonly<Record<Signature['meaning'], string>> = {
  prepared: 'Prepared',
  reviewed: 'Checked',
  approved: 'Approved',
  'confirmed-unchanged': 'Confirmed unchanged',
  withdrawn: 'Withdrawn',
};

/** Who signed what, when and in which role, with the hashes that prove it. */
export function signaturesSection(
  { signatures, sealSha256, engineVersion, reviewOn, state }: Evaluation,
  site: Pick<Settings, 'zone'>,
  printedAt: string,
): Content[] {
  const head = sectionHead(
    'Signatures',
    reviewOn ? `review on ${siteDate(reviewOn, site.zone)}` : '',
  );
  const isOpen = state === 'draft' || state === 'in-check' || state === 'checked';
  return [
    head,
    ...(isOpen
      ? [
          {
            text: `Not signed as of ${siteDate(printedAt, site.zone)}. A draft is no basis for work.`,
            bold: true,
            color: STOP,
          } as Content,
        ]
      : []),
    ...signatures.map(signatureBlock),
    ...(sealSha256
      ? [
          {
            margin: [0, 5, 0, 0],
            text: [
              `Sealed with inputs, results, engine ${engineVersion} and rule set. SHA-256 of the sealed record: `,
              { text: sealSha256, style: 'hash' },
            ],
          } as Content,
        ]
      : []),
  ];
}

function signatureBlock(signature: Signature): Content {
  const { meaning, signerName, signerRole, actingFor, at, zone, statement, comment } = signature;
  return {
    unbreakable: true,
    margin: [0, 3, 0, 3],
    stack: [
      {
        text: [
          { text: `${MEANINGS[meaning]} by ${signerName}`, bold: true },
          `, ${signerRole}${actingFor ? ` for ${actingFor}` : ''}, ${siteInstant(at, zone)}, ${signature.proof}`,
        ],
      },
      { text: statement, style: 'statement' },
      ...(comment ? [{ text: `“${comment}”` } as Content] : []),
      {
        text: `SHA-256 ${signature.sha256}${signature.verified ? '' : ', which is not that of what is stored now'}`,
        style: 'hash',
        ...(signature.verified ? {} : { color: STOP, bold: true }),
      },
    ],
  };
}
