import { Notice } from "#app/components/notice.tsx";

/**
 * From this mass up, a board is said to want two people. The NIOSH lifting equation's load constant is 23 kg (51 lb) for one
 * person in the best posture (NIOSH 94-110, 1994; from memory), and a long board is far from the best posture.
 */
const twoPeopleFromKg = 23;

/** Beside the weight that calls for it. */
export function LiftingCaution({ massKg }: { massKg: number }) {
  if (massKg < twoPeopleFromKg) return null;
  return (
    <Notice kind="caution" title="Heavy for one" className="mt-3">
      Two people, or a lift. One person's limit at best is 23 kg (51 lb): NIOSH lifting equation, 1994 (from memory).
      Local rules and trained practice come first.
    </Notice>
  );
}
