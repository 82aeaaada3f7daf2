import { Figures } from "#app/components/figures.tsx";
import type { ArmLoad } from "#app/core/weight/arm-load.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { speciesName, speciesTints } from "#app/domain/species/species-tints.ts";
import { LiftingCaution } from "#app/domain/weight/lifting-caution.tsx";
import { printMass } from "#app/domain/weight/mass-text.ts";
import type { WeightAnswer } from "./weight.ts";

/** One board, the stack, and what each arm bears of it. */
export function WeightResult({ answer }: { answer: WeightAnswer }) {
  const { units } = useShop();
  const { density, arms } = answer;
  const mass = (kg: number) => printMass(kg, units);
  return (
    <>
      <Figures
        title={`${speciesName(answer.species)} at ${answer.moisturePct} %`}
        main={{ label: "One board", value: mass(answer.boardKg) }}
        rows={[
          { label: `${answer.count} of them`, value: mass(answer.stackKg) },
          {
            label: "Density, water included",
            value:
              units === "in"
                ? `${(density.densityKgM3 * 0.062428).toFixed(1)} lb/ft³, ${answer.poundsPerBoardFoot.toFixed(2)} lb/bf`
                : `${Math.round(density.densityKgM3)} kg/m³`,
          },
          { label: "Wood there", value: `${answer.volumeM3.toFixed(4)} m³` },
          { label: "The most water this wood can hold", value: `${answer.greatestMoisturePct.toFixed(0)} %` },
        ]}
        beyond={[
          density.outsideRange,
          density.isShrinkageEstimated ? "Its shrinkage is not published and was estimated (Eq. 4-12)." : null,
        ]}
      >
        <p className="mt-3 text-ink-soft">Average wood: single boards stray 10 % and more either way.</p>
        <LiftingCaution massKg={answer.boardKg} />
      </Figures>
      {arms.length > 0 ? (
        <Figures title="On the arms of a rack" drawing={<ArmsDrawing answer={answer} />}>
          <ArmList arms={arms} />
        </Figures>
      ) : null}
    </>
  );
}

function ArmList({ arms }: { arms: ArmLoad[] }) {
  const { units } = useShop();
  return (
    <>
      <ol className="divide-y divide-line">
        {arms.map((arm, index) => (
          <li key={armName(index)} className="flex flex-wrap justify-between gap-x-4 py-2">
            <span className="text-ink-soft">Arm {index + 1}</span>
            <span className="font-semibold">
              {printMass(arm.massKg, units)}
              {arm.shareOfRating === null ? "" : `, ${Math.round(arm.shareOfRating * 100)} % of its rating`}
            </span>
          </li>
        ))}
      </ol>
      <p className="mt-2">{worst(arms)?.words}</p>
    </>
  );
}

const armName = (index: number) => `arm ${index + 1}`;

function worst(arms: ArmLoad[]): ArmLoad | undefined {
  return arms.toSorted((a, b) => b.massKg - a.massKg)[0];
}

/** The stack from the side, with a pressing mark under each arm as large as its share. */
function ArmsDrawing({ answer: { arms, species } }: { answer: WeightAnswer }) {
  const tints = speciesTints(species);
  const most = Math.max(...arms.map(({ massKg }) => massKg));
  const [width, pile] = [1000, 90];
  const gap = width / (arms.length - 1 || 1);
  return (
    <svg
      viewBox={`-60 0 ${width + 120} 260`}
      className="block h-auto w-full"
      role="img"
      aria-label="The stack on its arms, from the side"
    >
      <rect x="0" y="10" width={width} height={pile} fill={tints.base} stroke="#5b4a33" strokeWidth="3" />
      <path d={`M0 ${10 + pile / 3}H${width}M0 ${10 + (2 * pile) / 3}H${width}`} stroke="#5b4a33" strokeWidth="2" />
      {arms.map((arm, index) => {
        const long = 20 + (110 * arm.massKg) / most;
        const x = index * gap;
        return (
          <g key={armName(index)}>
            <rect x={x - 14} y={10 + pile} width="28" height="18" className="fill-iron-700" />
            <path
              d={`M${x} ${36 + pile}v${long}m-16 -18l16 18l16 -18`}
              fill="none"
              strokeWidth="8"
              className={arm.state === "over-rating" ? "stroke-wrong" : "stroke-action"}
            />
          </g>
        );
      })}
    </svg>
  );
}
