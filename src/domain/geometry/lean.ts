import { degrees, type Degree } from '../units/quantity';

export type Standing = {
  /** Of the pouch on edge, in mm. */
  readonly heightMm: number;
  readonly thicknessMm: number;
  /** Free width in mm between its face and what would catch it. Infinity: nothing would. */
  readonly gapMm: number;
  /** How high in mm the thing that would catch it reaches. */
  readonly supportHeightMm: number;
};

/**
 * How far a pouch on edge can fall over before something catches it, in degrees from upright; 90 is lying down.
 *
 * It turns about its lower edge. Either its upper corner meets the support, where
 *   height sin(a) + thickness cos(a) = thickness + gap,
 * or, where the support is too low for that, its face comes to rest on the support's upper edge: tan(a) = gap / support.
 */
export function leanOf({ heightMm, thicknessMm, gapMm, supportHeightMm }: Standing): Degree {
  if (gapMm <= 0) return degrees(0);
  const diagonal = Math.sqrt(heightMm * heightMm + thicknessMm * thicknessMm);
  const room = thicknessMm + gapMm;
  const cornerMeets = room < diagonal ? Math.atan2(heightMm, thicknessMm) - Math.acos(room / diagonal) : Math.PI / 2;
  const meetsAt = heightMm * Math.cos(cornerMeets);
  if (cornerMeets < Math.PI / 2 && meetsAt <= supportHeightMm) return inDegrees(cornerMeets);
  // Beyond its own reach the face never comes down on the edge: it lies down in front of the support.
  const restsOnEdge = Math.hypot(gapMm, supportHeightMm) < heightMm && supportHeightMm > 0;
  return restsOnEdge ? inDegrees(Math.atan2(gapMm, supportHeightMm)) : degrees(90);
}

function inDegrees(radians: number): Degree {
  return degrees((radians * 180) / Math.PI);
}
