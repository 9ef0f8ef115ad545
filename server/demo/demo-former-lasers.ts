import type { LaserInput, LaserTransition } from '@shared/model/lasers';

import type { Context } from '../context/context';
import { changeLaser, storeLaser, transitionLaser } from '../features/lasers/laser-service';
import { requireLaser } from '../features/lasers/laser-standing-service';
import type { Chronicle } from './demo-chronicle';
import type { Institute } from './demo-institute';
import type { DemoPersonId } from './demo-people';

/** Lasers that have left, and lasers that are still to come: not in the register's count. */
export function noteFormerLasers(chronicle: Chronicle, institute: Institute): void {
  const input = (tag: string, area: string, more: Partial<LaserInput>): LaserInput => ({
    tag,
    maker: 'Oakhollin',
    model: 'OH-0',
    homeBuilt: false,
    mobile: false,
    declaredClass: '4',
    areaId: institute.areaId(area),
    emissions: [],
    emissionSets: [],
    ...more,
  });
  noteDisposed(chronicle, input('L-900', 'C-006', { serial: 'OH0-0001', year: 1998 }));
  noteTransferred(chronicle, input('L-901', 'D-301', { serial: 'OH0-0077', year: 2004 }));
  notePurchases(chronicle, input);
}

/** Asked for by the supervisor, cleared by the LSO. */
function noteDisposed(chronicle: Chronicle, input: LaserInput): void {
  let id = '';
  chronicle.note(396, async (by) => {
    id = (await storeLaser(by('P25'), input, 'register')).id;
  });
  chronicle.note(385, async (by) => {
    const ctx = by('P25');
    const { version } = await requireLaser(ctx, id);
    const disposal = {
      method: 'Head removed and crushed; photo with the supervisor.',
      disabled: true,
      cordRemoved: true,
      hazardousPartsRemoved: true,
    };
    await changeLaser(ctx, id, { version, input: { ...input, disposal } });
  });
  chronicle.note(380, (by) =>
    step(by('P01'), id, { event: 'clear-disposal', reason: 'Seen without head and cord.' }),
  );
}

function noteTransferred(chronicle: Chronicle, input: LaserInput): void {
  let id = '';
  const reason = 'Handed over to a sister institute; its laser safety officer has taken it on.';
  chronicle.note(330, async (by) => {
    id = (await storeLaser(by('P28'), input, 'register')).id;
  });
  chronicle.note(315, (by) => step(by('P28'), id, { event: 'transfer', reason }));
  chronicle.note(310, (by) => step(by('P01'), id, { event: 'left-site', reason }));
}

type InputFor = (tag: string, area: string, more: Partial<LaserInput>) => LaserInput;

interface Purchase {
  readonly tag: string;
  readonly area: string;
  readonly by: DemoPersonId;
  readonly asked: number;
  /** The last step and its day. */
  readonly step?: readonly [LaserTransition['event'], number];
}

const PURCHASES: readonly Purchase[] = [
  { tag: 'R-1', area: 'B-204', by: 'P22', asked: 3 },
  { tag: 'R-2', area: 'C-012', by: 'P26', asked: 20, step: ['pass-preliminary-review', 12] },
  { tag: 'R-3', area: 'D-301', by: 'P28', asked: 44, step: ['pass-preliminary-review', 30] },
  { tag: 'R-4', area: 'A-110', by: 'P20', asked: 58, step: ['reject', 50] },
  { tag: 'R-5', area: 'C-005', by: 'P24', asked: 75, step: ['withdraw', 70] },
];

/** An order waits for the registration with the authority, which is not recorded here. */
function notePurchases(chronicle: Chronicle, input: InputFor): void {
  for (const { tag, area, by: person, asked, step: last } of PURCHASES) {
    let id = '';
    chronicle.note(asked, async (by) => {
      const wanted = input(tag, area, { maker: 'Quenlorn', model: `planned, ${tag}` });
      id = (await storeLaser(by(person), wanted, 'request-purchase')).id;
    });
    if (!last) continue;
    const [event, daysAgo] = last;
    const reason = 'A laser of the institute can be used instead.';
    const actor = event === 'withdraw' ? person : 'P01';
    chronicle.note(daysAgo, (by) =>
      step(by(actor), id, event === 'reject' ? { event, reason } : { event }),
    );
  }
}

async function step(ctx: Context, id: string, move: LaserTransition): Promise<void> {
  const { version } = await requireLaser(ctx, id);
  await transitionLaser(ctx, id, { version, step: move });
}
