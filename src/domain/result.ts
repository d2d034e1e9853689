/** How the core says no: a value, never an exception, for every outcome that can be expected. */
export type Refusal<Code extends string = string> = {
  /** Stable, for programs. */
  readonly code: Code;
  /** One plain sentence, for people. */
  readonly sentence: string;
};

export type Result<Value, Code extends string = string> =
  { readonly ok: true; readonly value: Value } | { readonly ok: false; readonly refusal: Refusal<Code> };

export function accept<Value>(value: Value): { readonly ok: true; readonly value: Value } {
  return { ok: true, value };
}

export function refuse<Code extends string>(
  code: Code,
  sentence: string,
): { readonly ok: false; readonly refusal: Refusal<Code> } {
  return { ok: false, refusal: { code, sentence } };
}
