import { z } from 'zod';
import './plain-words';

export const idSchema = z.uuid();

/** An instant on the wire: ISO 8601, UTC, with Z. */
export const instantSchema = z.iso.datetime();

/** A calendar day: YYYY-MM-DD. */
export const dateSchema = z.iso.date();

/** Made by the client for every write, so that a repeated request changes nothing. */
export const requestIdSchema = z.uuid();

/** Text a person types: trimmed, without control characters. */
export function textSchema(greatestLength: number) {
  return z
    .string()
    .trim()
    .min(1, 'Please fill this in.')
    .max(greatestLength, `At most ${greatestLength} characters.`)
    .refine(
      (text) => !/[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f]/.test(text),
      'This has a character that cannot be kept.',
    );
}

export const reasonSchema = textSchema(500);
