import { celsius, kg, mm, seconds } from '../units/quantity';
import {
  choiceColumn,
  codesColumn,
  numberColumn,
  numberOrNothingColumn,
  textColumn,
  textOrNothingColumn,
  yesNoColumn,
  type Column,
  type ColumnSet,
} from './csv-column';
import { cycleTypes } from './cycle-need-text';
import {
  holderConditions,
  holderForms,
  serviceStates,
  sizeClasses,
  surfaces,
  type HolderFields,
  type HolderKindFields,
  type ProgramFields,
  type ShelfLine,
  type SterilizerFields,
} from './equipment-fields';

const count = (value: number) => value;

function orElse<Value>(column: Column<Value>, whenEmpty: Value): Column<Value> {
  return { ...column, whenEmpty };
}

const placeCode = textOrNothingColumn({
  name: 'place_code',
  about: 'Given by Paperside. Leave it empty for what is new, and as it is for what is there.',
  example: '',
});

/** The programs file: one line per program, known by its code. */
export const programColumns: ColumnSet<ProgramFields> = {
  code: textColumn({ name: 'code', about: 'Your code for it. It stays as it is for good.', example: 'W4-30' }),
  name: textColumn({ name: 'name', about: 'What people call it.', example: 'Wrapped, 4 min, dry 30 min' }),
  type: choiceColumn(
    {
      name: 'cycle_type',
      about: `One of ${cycleTypes.join(', ')}. With another type, temperature, exposure or drying a program loses its qualification on every sterilizer.`,
      example: 'dynamic-air-removal',
    },
    cycleTypes,
  ),
  temperatureC: numberColumn({ name: 'temperature_c', about: 'Temperature of the exposure.', example: '132' }, celsius),
  exposureS: numberColumn({ name: 'exposure_s', about: 'Exposure in seconds.', example: '240' }, seconds),
  dryS: numberColumn({ name: 'dry_s', about: 'Drying in seconds.', example: '1800' }, seconds),
  greatestLoadMassKg: numberOrNothingColumn(
    {
      name: 'greatest_load_mass_kg',
      about: 'Greatest mass it was qualified with. Empty: the sterilizer’s.',
      example: '',
    },
    kg,
  ),
  isRetired: yesNoColumn({ name: 'retired', about: 'yes when it is no longer run. Empty: no.', example: 'no' }, false),
};

/** The sterilizers file: one line per sterilizer, known by its code. */
export const sterilizerColumns: ColumnSet<SterilizerFields> = {
  code: textColumn({ name: 'code', about: 'Your code for it. It stays as it is for good.', example: 'ST-1' }),
  number: textColumn({ name: 'number', about: 'Its number in the load number. It stays for good.', example: '1' }),
  name: textColumn({ name: 'name', about: 'What people call it.', example: 'Sterilizer 1' }),
  sizeClass: choiceColumn(
    { name: 'size_class', about: 'large or small: which carts fit.', example: 'large' },
    sizeClasses,
  ),
  chamberWidthMm: numberColumn({ name: 'chamber_width_mm', about: 'Free width of the chamber.', example: '620' }, mm),
  chamberDepthMm: numberColumn({ name: 'chamber_depth_mm', about: 'Free depth of the chamber.', example: '1250' }, mm),
  chamberHeightMm: numberColumn(
    { name: 'chamber_height_mm', about: 'Free height of the chamber.', example: '700' },
    mm,
  ),
  drainXMm: numberColumn(
    { name: 'drain_x_mm', about: 'Drain, to the right of the lowest shelf’s left front corner.', example: '280' },
    mm,
  ),
  drainYMm: numberColumn({ name: 'drain_y_mm', about: 'Drain, behind that corner.', example: '90' }, mm),
  greatestLoadMassKg: numberColumn(
    { name: 'greatest_load_mass_kg', about: 'Greatest mass of a load.', example: '100' },
    kg,
  ),
  steamLine: orElse(textColumn({ name: 'steam_line', about: 'The steam line it hangs on.', example: 'A' }), ''),
  hasAirDetector: yesNoColumn({ name: 'air_detector', about: 'yes or no. Empty: no.', example: 'no' }, false),
  needsAirRemovalTest: yesNoColumn(
    {
      name: 'needs_air_removal_test',
      about: 'Whether the air-removal test is asked for each day. Empty: yes.',
      example: 'yes',
    },
    true,
  ),
  serviceState: orElse(
    choiceColumn(
      { name: 'service_state', about: `One of ${serviceStates.join(', ')}. Empty: in-service.`, example: 'in-service' },
      serviceStates,
    ),
    'in-service',
  ),
  qualifiedPrograms: codesColumn({
    name: 'qualified_programs',
    about: 'Codes of the programs it is qualified for, separated by spaces.',
    example: 'W4-20 W4-30',
  }),
  otherPrograms: codesColumn({
    name: 'other_programs',
    about: 'Codes of programs on its panel that it is not qualified for.',
    example: '',
  }),
};

/** The carts file: one line per shelf, known by its cart's code and its level. */
export const shelfColumns: ColumnSet<ShelfLine> = {
  cartCode: textColumn({ name: 'cart', about: 'Code of the cart. It stays as it is for good.', example: 'C1' }),
  cartName: textColumn({
    name: 'cart_name',
    about: 'What people call the cart: the same on each of its lines.',
    example: 'Cart 1',
  }),
  sizeClass: choiceColumn(
    {
      name: 'size_class',
      about: 'large or small: which sterilizers it fits. The same on each line of a cart.',
      example: 'large',
    },
    sizeClasses,
  ),
  isCartUsable: yesNoColumn(
    { name: 'cart_usable', about: 'no when the cart is taken out. Empty: yes.', example: 'yes' },
    true,
  ),
  cartNote: orElse(
    textColumn({ name: 'cart_note', about: 'What people should know about the cart.', example: '' }),
    '',
  ),
  level: numberColumn({ name: 'level', about: '1 is the lowest shelf.', example: '1' }, count),
  name: textColumn({ name: 'shelf_name', about: 'What people call the shelf.', example: 'Lower shelf' }),
  placeCode,
  widthMm: numberColumn({ name: 'width_mm', about: 'Width, left to right.', example: '560' }, mm),
  depthMm: numberColumn({ name: 'depth_mm', about: 'Depth, away from the door.', example: '1150' }, mm),
  clearHeightMm: numberColumn({ name: 'clear_height_mm', about: 'Free height above it.', example: '340' }, mm),
  surface: choiceColumn({ name: 'surface', about: 'wire or solid.', example: 'wire' }, surfaces),
  greatestMassKg: numberColumn({ name: 'greatest_mass_kg', about: 'Greatest mass it carries.', example: '60' }, kg),
  isUsable: yesNoColumn(
    { name: 'shelf_usable', about: 'no when the shelf is taken out. Empty: yes.', example: 'yes' },
    true,
  ),
};

/** The kinds of holders file: one line per kind, known by its code. */
export const holderKindColumns: ColumnSet<HolderKindFields> = {
  code: textColumn({ name: 'code', about: 'Your code for it. It stays as it is for good.', example: 'RS' }),
  name: textColumn({ name: 'name', about: 'What people call it.', example: 'Small pouch rack' }),
  form: choiceColumn({ name: 'form', about: `One of ${holderForms.join(', ')}.`, example: 'rack' }, holderForms),
  slots: numberOrNothingColumn({ name: 'slots', about: 'How many slots a rack has.', example: '8' }, count),
  pitchMm: numberOrNothingColumn(
    { name: 'pitch_mm', about: 'From the middle of a slot to the next.', example: '28' },
    mm,
  ),
  greatestHeightMm: numberOrNothingColumn(
    { name: 'greatest_height_mm', about: 'Greatest height of a pouch standing in it.', example: '130' },
    mm,
  ),
  greatestLengthMm: numberOrNothingColumn(
    { name: 'greatest_length_mm', about: 'Greatest length of a pouch along the slot.', example: '340' },
    mm,
  ),
  greatestThicknessMm: numberOrNothingColumn(
    { name: 'greatest_thickness_mm', about: 'Greatest thickness of a pouch.', example: '18' },
    mm,
  ),
  acrossMm: numberColumn({ name: 'across_mm', about: 'Its own size across the slots.', example: '240' }, mm),
  alongMm: numberColumn({ name: 'along_mm', about: 'Its own size along the slots.', example: '350' }, mm),
  massKg: numberColumn({ name: 'mass_kg', about: 'Its own mass.', example: '0.9' }, kg),
  owned: orElse(numberColumn({ name: 'owned', about: 'How many you own. Empty: 0.', example: '5' }, count), 0),
};

/** The holders file: one line per holder, known by its name. */
export const holderColumns: ColumnSet<HolderFields> = {
  name: textColumn({ name: 'name', about: 'What is written on it. It stays as it is for good.', example: 'RS-1' }),
  kind: textColumn({ name: 'kind', about: 'Code of its kind.', example: 'RS' }),
  condition: orElse(
    choiceColumn(
      { name: 'condition', about: `One of ${holderConditions.join(', ')}. Empty: good.`, example: 'good' },
      holderConditions,
    ),
    'good',
  ),
  placeCode,
};
