import type { Knex } from 'knex';
import type { Role } from '../src/domain/access/permissions';
import { formatBadgeCode } from '../src/domain/label/badge-code';
import { hashSecret } from '../server/platform/secret-hash';
import { hospitalId, surgeryCenterId } from './demonstration-facilities';

/*
 * The invented staff of the demonstration. The passwords, badges and PINs here are printed for every visitor to read:
 * they are for the demonstration only, and nobody of a real hospital may ever be given one of them.
 */

type Secrets = { readonly password: string; readonly pin: string };

const secretsOf: Readonly<Record<Role, Secrets>> = {
  technician: { password: 'kettle moss and nine herons', pin: '730418' },
  lead: { password: 'a violin under the tall ferry', pin: '604193' },
  supervisor: { password: 'copper plums before winter rain', pin: '285917' },
  'infection-prevention': { password: 'small owls count the harbor lights', pin: '917360' },
  'operating-room': { password: 'red thread across a quiet river', pin: '461802' },
  engineer: { password: 'brass moths around the boiler moon', pin: '839275' },
  surveyor: { password: 'paper boats cross at the old weir', pin: '570621' },
  administrator: { password: 'twelve keys beneath a lemon tree', pin: '382604' },
};

type Member = {
  readonly initials: string;
  readonly name: string;
  readonly role: Role;
  readonly usualShift: string | null;
  readonly staffNumber: string;
  readonly badgeNumber: number;
  readonly facilityIds: readonly string[];
};

function atHospital(
  initials: string,
  name: string,
  role: Role,
  { shift, number, badge }: { readonly shift: string | null; readonly number: number; readonly badge: number },
): Member {
  return {
    initials,
    name,
    role,
    usualShift: shift,
    staffNumber: `T${number}`,
    badgeNumber: badge,
    facilityIds: [hospitalId],
  };
}

function atSurgeryCenter(
  initials: string,
  name: string,
  role: Role,
  { number, badge }: { readonly number: number; readonly badge: number },
): Member {
  return {
    initials,
    name,
    role,
    usualShift: 'Day',
    staffNumber: `Q${number}`,
    badgeNumber: badge,
    facilityIds: [surgeryCenterId],
  };
}

const supervisorOfBoth = atHospital('KV', 'Kjell Varanasi-Holt', 'supervisor', {
  shift: 'Day',
  number: 1047,
  badge: 61_840_275,
});

const members: readonly Member[] = [
  atHospital('OB', 'Odessa Brannick', 'supervisor', { shift: 'Day', number: 1031, badge: 48_120_937 }),
  { ...supervisorOfBoth, facilityIds: [hospitalId, surgeryCenterId] },
  atHospital('LM', 'Lucasta Mburu', 'lead', { shift: 'Day', number: 1102, badge: 27_593_804 }),
  atHospital('TP', 'Tobiah Pellegrew', 'lead', { shift: 'Evening', number: 1118, badge: 93_067_142 }),
  atHospital('SN', 'Sunniva Okonjo-Reed', 'lead', { shift: 'Night', number: 1125, badge: 15_738_206 }),
  atHospital('DR', 'Dafydd Rosensaft', 'lead', { shift: 'Weekend day', number: 1133, badge: 70_249_581 }),
  atHospital('AW', 'Amabel Wyncote', 'technician', { shift: 'Day', number: 2041, badge: 36_915_470 }),
  atHospital('JQ', 'Joaquin Quellmalz', 'technician', { shift: 'Day', number: 2056, badge: 82_604_713 }),
  atHospital('HS', 'Hana Strudwick', 'technician', { shift: 'Day', number: 2063, badge: 54_371_098 }),
  atHospital('BN', 'Benedikta Nwachi', 'technician', { shift: 'Evening', number: 2074, badge: 19_486_325 }),
  atHospital('FC', 'Fiorello Crake', 'technician', { shift: 'Evening', number: 2088, badge: 65_902_817 }),
  atHospital('YT', 'Yevgenia Tamm-Arroyo', 'technician', { shift: 'Evening', number: 2095, badge: 31_857_460 }),
  atHospital('EG', 'Eluned Gastrell', 'technician', { shift: 'Night', number: 2109, badge: 77_014_639 }),
  atHospital('RU', 'Rutger Mwangi-Sloane', 'technician', { shift: 'Night', number: 2117, badge: 42_698_153 }),
  atHospital('VP', 'Vashti Pomfret', 'technician', { shift: 'Weekend night', number: 2126, badge: 88_530_274 }),
  atHospital('CO', 'Cosmo Ibarruri', 'technician', { shift: 'Weekend day', number: 2134, badge: 23_761_908 }),
  atHospital('ML', 'Maud Lindqvist-Asante', 'technician', { shift: 'Day', number: 2148, badge: 59_407_831 }),
  atHospital('PT', 'Perpetua Thackeray', 'infection-prevention', { shift: 'Day', number: 3012, badge: 12_953_684 }),
  atHospital('GH', 'Gethin Halloran-Bey', 'engineer', { shift: 'Day and call', number: 3027, badge: 96_208_347 }),
  atHospital('ZO', 'Zoltan Oyelaran', 'operating-room', { shift: 'Day', number: 3035, badge: 40_816_592 }),
  atHospital('IF', 'Isidore Fennimore-Adeyemi', 'administrator', { shift: 'Day', number: 9003, badge: 67_325_019 }),
  atHospital('CH', 'Cressida Holmqvist', 'surveyor', { shift: null, number: 9018, badge: 28_190_746 }),
  atSurgeryCenter('NB', 'Nerys Balogun-Pike', 'administrator', { number: 101, badge: 73_641_285 }),
  atSurgeryCenter('AD', 'Anselm Dragomir', 'lead', { number: 114, badge: 34_079_516 }),
  atSurgeryCenter('WL', 'Winifred Lazarou', 'technician', { number: 127, badge: 85_912_360 }),
];

/** Days a surveyor of the demonstration may look round, counted from the day it was laid out. */
const surveyorDays = 90;

/** Days before the demonstration's today on which its people began. */
const beganDaysAgo = 60;

export type DemonstrationPerson = {
  readonly id: string;
  readonly initials: string;
  readonly name: string;
  readonly role: Role;
};

function idOf(index: number): string {
  return `0198a000-0000-7000-8001-${String(index + 1).padStart(12, '0')}`;
}

/** Everyone, with ids that are the same every time. */
export const demonstrationPeople: readonly DemonstrationPerson[] = members.map(({ initials, name, role }, index) => ({
  id: idOf(index),
  initials,
  name,
  role,
}));

/** The id of a person by the initials they sign with: "LM". */
export function demonstrationPersonId(initials: string): string {
  const found = demonstrationPeople.find((person) => person.initials === initials);
  if (!found) throw new Error(`Nobody in the demonstration signs with ${initials}.`);
  return found.id;
}

export type DemonstrationSignIn = {
  readonly name: string;
  readonly role: Role;
  readonly staffNumber: string;
  readonly password: string;
  readonly badge: string;
  readonly pin: string;
};

function signInOf({ name, role, staffNumber, badgeNumber }: Member): DemonstrationSignIn {
  return { name, role, staffNumber, ...secretsOf[role], badge: formatBadgeCode(badgeNumber) };
}

/** Sign-ins of everyone in the demonstration. For the demonstration only. */
export const allDemonstrationSignIns: readonly DemonstrationSignIn[] = members.map(signInOf);

const shown = ['AW', 'LM', 'OB', 'PT', 'ZO', 'GH', 'CH', 'IF'];

/** One sign-in for each role, to be printed for visitors. For the demonstration only. */
export const demonstrationSignIns: readonly DemonstrationSignIn[] = members
  .filter(({ initials }) => shown.includes(initials))
  .sort((one, other) => shown.indexOf(one.initials) - shown.indexOf(other.initials))
  .map(signInOf);

/** The staff of both facilities, who must be there already. */
export async function seedPeople(trx: Knex.Transaction, now: Date): Promise<void> {
  const dayMs = 24 * 3_600_000;
  const hashes = new Map(
    await Promise.all(
      Object.entries(secretsOf).map(async ([role, { password, pin }]) => {
        const [passwordHash, pinHash] = await Promise.all([hashSecret(password), hashSecret(pin)]);
        return [role, { passwordHash, pinHash }] as const;
      }),
    ),
  );
  await trx('people').insert(
    members.map((member, index) => ({
      id: idOf(index),
      staff_number: member.staffNumber,
      display_name: member.name,
      initials: member.initials,
      password_hash: hashes.get(member.role)?.passwordHash,
      badge_code: formatBadgeCode(member.badgeNumber),
      pin_hash: hashes.get(member.role)?.pinHash,
      created_at: new Date(now.getTime() - beganDaysAgo * dayMs),
    })),
  );
  await trx('memberships').insert(
    members.flatMap((member, index) =>
      member.facilityIds.map((facilityId) => ({
        person_id: idOf(index),
        facility_id: facilityId,
        role: member.role,
        usual_shift: member.usualShift,
        expires_at: member.role === 'surveyor' ? new Date(now.getTime() + surveyorDays * dayMs) : null,
      })),
    ),
  );
}
