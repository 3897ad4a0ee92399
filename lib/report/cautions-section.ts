import { DEFAULT_SOURCE } from '@/lib/casefile/defaults';
import type { CaseFile } from '@/lib/casefile/schema';
import { VEHICLE_IDS } from '@/lib/casefile/schema';
import type { Section } from './report';
import { STANDING_CAUTIONS } from './standing-cautions';

interface Caution {
  says: string;
  /** Left out: always shown. */
  when?: (casefile: CaseFile) => boolean;
}

const hasSeats = (casefile: CaseFile): boolean =>
  VEHICLE_IDS.some((id) => (casefile.vehicles[id].seats ?? []).length > 0);
const hasDefaults = (casefile: CaseFile): boolean => JSON.stringify(casefile).includes(JSON.stringify(DEFAULT_SOURCE));
const hasTravel = (casefile: CaseFile): boolean => VEHICLE_IDS.some((id) => casefile.departure[id]);
const hasRecorded = (casefile: CaseFile): boolean => VEHICLE_IDS.some((id) => casefile.recorded?.[id]);
const hasDamage = (casefile: CaseFile): boolean => VEHICLE_IDS.some((id) => casefile.damage?.[id]);

const CAUTIONS: Caution[] = [
  ...STANDING_CAUTIONS.map((says) => ({ says })),
  {
    says: 'Delta-V at a seat is the kinematics of a rigid vehicle at that place, not the motion of an occupant.',
    when: hasSeats,
  },
  { says: 'The limits of the checks are aids, not standards. That no check speaks up is not a validation.' },
  {
    says: 'Some inputs are starting values that nobody has measured for this case; they are marked in the table of inputs.',
    when: hasDefaults,
  },
  { says: 'Absence of damage is weak evidence unless its probability has been assessed.', when: hasDamage },
  {
    says: 'Rest positions may reflect what a driver did, or later movement, and not the contact alone.',
    when: hasTravel,
  },
  { says: 'The plan illustrates one computed case; it is not a recording.' },
  { says: 'Nothing is found here about avoidability, fault or credibility; beware of hindsight.' },
  { says: 'Recorder data need a qualified download, and matching to the event.', when: hasRecorded },
  {
    says: 'Software can be wrong. Its version is printed on every page, and the worked lines are there to be checked by hand.',
  },
  { says: 'Case data are personal data; keeping and disclosing them is the duty of the user under local law.' },
];

/** The cautions that go with every result, and those that this case calls for. */
export const cautionsSection = (casefile: CaseFile): Section => ({
  id: 'cautions',
  title: 'Cautions',
  blocks: [
    {
      kind: 'list',
      ordered: true,
      items: CAUTIONS.filter(({ when }) => when?.(casefile) ?? true).map(({ says }) => says),
    },
  ],
});
