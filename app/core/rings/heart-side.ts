import { foldDeg } from "./angle.ts";
import type { RingField } from "./ring-types.ts";

/** Where the heart of the tree lies: beyond the top face as drawn, beyond the bottom face, or in the board itself. */
export type HeartSide = "top" | "bottom" | "inside";

/** Turn of the rings from edge to edge, degrees, below which they do not tell where their centre is. */
const leastTurnDeg = 1;

/**
 * The side of the heart: the face nearer the pith. Without a recorded pith it is told from how the rings turn: they close round a centre below where
 * they fall ever more to the right. Null where the rings run straight, or where the pith lies beside the board and the rings stand upright.
 */
export function heartSide({ pith, widthMm, thicknessMm, stations }: RingField): HeartSide | null {
  if (pith) {
    if (pith.yMm <= 0) return "top";
    if (pith.yMm >= thicknessMm) return "bottom";
    return pith.xMm > 0 && pith.xMm < widthMm ? "inside" : null;
  }
  // Step by step, as rings that close round a near pith turn by more than 90 degrees from edge to edge.
  const turn = stations.reduce((sum, { signedDeg }, i) => {
    const before = stations[i - 1];
    return before ? sum + foldDeg(signedDeg - before.signedDeg) : sum;
  }, 0);
  if (Math.abs(turn) < leastTurnDeg) return null;
  return turn > 0 ? "bottom" : "top";
}

/**
 * The face that turns hollow as the board dries: the bark face, away from the heart, because wood shrinks more along its rings than across them
 * [secondary: trade reference, section 8]. Null where no face does: rings straight or upright, or the pith inside, where a board checks instead.
 */
export function hollowWhenDrying(field: RingField): "top" | "bottom" | null {
  const heart = heartSide(field);
  if (heart === "top") return "bottom";
  return heart === "bottom" ? "top" : null;
}
