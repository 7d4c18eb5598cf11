import * as z from 'zod/mini';
import { PRODUCTS } from '../timber/member.ts';
import { MAX_FILE_NAME, MAX_YARD } from './session.ts';

/** What the schema is put together from: texts of a length, lengths within bounds. */
export interface Parts {
  text(least: number, most: number): z.ZodMiniString;
  length(least: number, most: number, words: string): z.ZodMiniString;
}

const NAME_LENGTH = 60;
const MOST_LENGTHS = 60;
const FEET = 12;
const LONGEST = 200 * FEET;
/** Nothing costs nothing: what has no price is left without one. */
const LEAST_MONEY = 1e-6;
const MOST_MONEY = 1e9;

export type YardRowFile = z.infer<ReturnType<typeof yardRow>>;
export type PriceRowFile = z.infer<ReturnType<typeof priceRow>>;

/** `yard`: the name of a CSV file beside the session, or its lines. */
export function yard(parts: Parts) {
  return z
    .union([parts.text(1, MAX_FILE_NAME), z.array(yardRow(parts)).check(z.maxLength(MAX_YARD))])
    .register(z.globalRegistry, {
      description: 'what the yard has: the name of a CSV file, from the folder of the session, or its lines',
    });
}

/** `prices`: what woods cost where the yard list does not say. */
export function prices(parts: Parts) {
  return z.array(priceRow(parts)).check(z.maxLength(MAX_YARD)).register(z.globalRegistry, {
    description: 'what woods cost where the yard list does not say; the first line that fits holds',
  });
}

export function yardRow(parts: Parts) {
  return z.strictObject({
    size: parts.text(1, NAME_LENGTH),
    ...wood(parts),
    lengths: z.optional(
      z.array(parts.length(FEET, LONGEST, '1 ft to 200 ft')).check(z.minLength(1), z.maxLength(MOST_LENGTHS)),
    ),
    ...money(),
  });
}

function priceRow(parts: Parts) {
  return z.strictObject({ size: z.optional(parts.text(1, NAME_LENGTH)), ...wood(parts), ...money() });
}

function wood(parts: Parts) {
  return {
    product: z.optional(z.enum(PRODUCTS)),
    species: z.optional(parts.text(1, NAME_LENGTH)),
    grade: z.optional(parts.text(1, NAME_LENGTH)),
  };
}

function money() {
  const amount = z.optional(z.number().check(z.minimum(LEAST_MONEY), z.maximum(MOST_MONEY)));
  return { each: amount, perFoot: amount, perBoardFoot: amount };
}
