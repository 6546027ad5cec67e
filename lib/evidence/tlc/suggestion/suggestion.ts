import type { Point } from '../polyline';
import type { GroundKind } from './contrast';

/** The version of the method, kept with what was proposed. */
export const SUGGESTION_METHOD_VERSION = 'plate-suggestion-1';

export type SuggestedSpot = Point & {
  /** Null where baseline or front was not found. */
  rf: number | null;
  /** Share of the lane's whole area under its profile, 0 to 1. */
  relativeIntensity: number;
  shape: 'spot' | 'streak';
  /** 0 to 1. */
  confidence: number;
};

/** A lane stands where it crosses the baseline (or the bottom of the plate). */
export type SuggestedLane = Point & {
  spots: SuggestedSpot[];
};

/**
 * What could be marked on a plate's photo. All places in pixels of the photo as shown, origin top left; nothing
 * of it counts before a chemist has looked at it.
 */
export type PlateSuggestion = {
  /** Top left, top right, bottom right, bottom left. */
  corners: Point[];
  /** 2, 3 or 5 points from left to right; empty where no line was seen. */
  baseline: Point[];
  front: Point[];
  lanes: SuggestedLane[];
  ground: GroundKind;
  /** 0 to 1: of the least certain of corners, lines and spots. */
  confidence: number;
  /** What lowers the confidence and what to do about it, in words for the user. */
  reasons: string[];
  methodVersion: string;
};
