import { kg, mm, seconds } from '../units/quantity';
import {
  choiceColumn,
  choiceOrNothingColumn,
  codesColumn,
  numberColumn,
  numberOrNothingColumn,
  textColumn,
  textOrNothingColumn,
  yesNoColumn,
  type ColumnSet,
} from './csv-column';
import { readCycleNeeds, writeCycleNeeds } from './cycle-need-text';
import { readFilterZones, writeFilterZones } from './filter-zone-text';
import { expiryRules, itemKinds, metals, packagings, poses, pouchFacings, type ItemFields } from './item-fields';

const cooling = numberColumn(
  { name: 'cooling_min', about: 'Minutes to cool before it is touched. Empty: 30.', example: '60' },
  (minutes) => seconds(Math.round(minutes * 60)),
);

/** The items file: one line per item, known by its code. */
export const itemColumns: ColumnSet<ItemFields> = {
  code: textColumn({ name: 'code', about: 'Your code for it. It stays as it is for good.', example: 'W-01' }),
  name: textColumn({ name: 'name', about: 'What people call it.', example: 'Minor set' }),
  kind: choiceColumn({ name: 'kind', about: `One of ${itemKinds.join(', ')}.`, example: 'wrapped-tray' }, itemKinds),
  packaging: choiceColumn(
    { name: 'packaging', about: `One of ${packagings.join(', ')}.`, example: 'wrap' },
    packagings,
  ),
  lengthMm: numberColumn({ name: 'length_mm', about: 'Long side, lying flat.', example: '560' }, mm),
  widthMm: numberColumn({ name: 'width_mm', about: 'Short side, lying flat.', example: '260' }, mm),
  heightMm: numberColumn(
    { name: 'height_mm', about: 'Height lying flat; of a pouch, its thickness when full.', example: '110' },
    mm,
  ),
  massKg: numberColumn({ name: 'mass_kg', about: 'Mass with its packaging.', example: '5.4' }, kg),
  metalMassKg: {
    ...numberColumn({ name: 'metal_mass_kg', about: 'Of that, metal. Empty: 0.', example: '4.8' }, kg),
    whenEmpty: kg(0),
  },
  textileMassKg: {
    ...numberColumn({ name: 'textile_mass_kg', about: 'Of that, textile. Empty: 0.', example: '0.2' }, kg),
    whenEmpty: kg(0),
  },
  metal: {
    ...choiceColumn(
      { name: 'metal', about: `One of ${metals.join(', ')}. Empty: stainless-steel.`, example: 'stainless-steel' },
      metals,
    ),
    whenEmpty: 'stainless-steel',
  },
  isImplant: yesNoColumn({ name: 'implant', about: 'yes or no. Empty: no.', example: 'no' }, false),
  pose: choiceColumn({ name: 'pose', about: `How it must rest: ${poses.join(', ')}.`, example: 'flat' }, poses),
  isPerforated: yesNoColumn(
    { name: 'perforated', about: 'Whether steam and water pass its floor: yes or no. Empty: yes.', example: 'yes' },
    true,
  ),
  clearanceMm: numberOrNothingColumn(
    {
      name: 'clearance_mm',
      about: 'Free space its instructions ask for on every side. Empty: they do not say.',
      example: '25',
    },
    mm,
  ),
  standsOn: codesColumn({
    name: 'stands_on',
    about: 'Codes of the items it may stand on, separated by spaces. Empty: on none.',
    example: '',
  }),
  greatestStackHeightMm: numberOrNothingColumn(
    {
      name: 'greatest_stack_height_mm',
      about: 'Greatest height of a stack it is part of. Empty: they do not say.',
      example: '',
    },
    mm,
  ),
  filterZones: {
    name: 'filter_zones',
    about:
      'Open filters of a rigid container, in mm: face, length x width, at, distance along and across. Several: separated by |.',
    example: '',
    read: readFilterZones,
    write: writeFilterZones,
    whenEmpty: [],
  },
  cycleNeeds: {
    name: 'cycles',
    about:
      'Cycles its instructions permit: type, temperature, least exposure (or least-greatest), dry. Several: separated by |.',
    example: 'dynamic-air-removal 132 C 240 s dry 1800 s',
    read: readCycleNeeds,
    write: writeCycleNeeds,
  },
  preferredHolder: textOrNothingColumn({
    name: 'holder',
    about: 'Code of the kind of holder a pouch belongs in. Empty: none.',
    example: '',
  }),
  facing: choiceOrNothingColumn(
    {
      name: 'facing',
      about: 'What the instructions of a pouch ask for: one-way or alternating. Empty: they do not say.',
      example: '',
    },
    pouchFacings,
  ),
  massLimitKg: numberOrNothingColumn(
    { name: 'mass_limit_kg', about: 'Greatest mass its instructions permit. Empty: they do not say.', example: '11.3' },
    kg,
  ),
  coolS: { ...cooling, write: (value) => String(value / 60), whenEmpty: seconds(1_800) },
  expiryRule: {
    ...choiceColumn(
      { name: 'expiry', about: 'event-related or dated. Empty: event-related.', example: 'event-related' },
      expiryRules,
    ),
    whenEmpty: 'event-related',
  },
  expiryDays: numberOrNothingColumn(
    { name: 'expiry_days', about: 'Days until a dated package expires.', example: '' },
    (days) => days,
  ),
  deviceIdentifier: textOrNothingColumn({
    name: 'device_identifier',
    about: 'GTIN or HIBC on the device. Empty: none.',
    example: '',
  }),
  ifuReference: textOrNothingColumn({
    name: 'ifu_reference',
    about: 'Your reference to its instructions for use. Empty: not on file.',
    example: 'IFU-W-01',
  }),
  ifuRevision: textOrNothingColumn({ name: 'ifu_revision', about: 'Their revision.', example: '2' }),
  service: { ...textColumn({ name: 'service', about: 'Where it is used.', example: 'OR' }), whenEmpty: '' },
  note: { ...textColumn({ name: 'note', about: 'What else people should know.', example: '' }), whenEmpty: '' },
  isRetired: yesNoColumn(
    { name: 'retired', about: 'yes when it is no longer packed. Empty: no.', example: 'no' },
    false,
  ),
};
