declare const unit: unique symbol;

/** A number that carries its unit in its type, so that a length can never be handed over as a mass. */
export type Quantity<Unit extends string> = number & { readonly [unit]: Unit };

export type Millimetre = Quantity<'mm'>;
export type Kilogram = Quantity<'kg'>;
export type Celsius = Quantity<'degC'>;
export type Second = Quantity<'s'>;
export type Degree = Quantity<'deg'>;
export type Percent = Quantity<'%'>;
export type KilogramPerMinute = Quantity<'kg/min'>;

export function mm(value: number): Millimetre {
  return value as Millimetre;
}

export function kg(value: number): Kilogram {
  return value as Kilogram;
}

export function celsius(value: number): Celsius {
  return value as Celsius;
}

export function seconds(value: number): Second {
  return value as Second;
}

export function degrees(value: number): Degree {
  return value as Degree;
}

export function percent(value: number): Percent {
  return value as Percent;
}

export function kilogramsPerMinute(value: number): KilogramPerMinute {
  return value as KilogramPerMinute;
}
