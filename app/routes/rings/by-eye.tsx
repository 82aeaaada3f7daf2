import { useState } from "react";
import { data, Form, href, redirect } from "react-router";
import { z } from "zod";
import { Button, ButtonLink } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { Notice } from "#app/components/notice.tsx";
import { fieldFromAngle } from "#app/core/rings/field-from-angle.ts";
import { classOf } from "#app/core/rings/summary.ts";
import { getBoard } from "#app/domain/boards/boards.sql.server.ts";
import { EndDrawing } from "#app/domain/boards/end-drawing.tsx";
import { EyeFields } from "#app/domain/rings/eye-fields.tsx";
import { angleMethod } from "#app/domain/rings/methods.ts";
import { boardEnds } from "#app/domain/rings/reading.ts";
import { keepReading } from "#app/domain/rings/rings.server.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { dbContext } from "#app/server/context.server.ts";
import { notHere, requireFound, requireRole } from "#app/server/guards.server.ts";
import { systemClock } from "#app/services/clock.server.ts";
import type { Route } from "./+types/by-eye.ts";

const form = z.object({
  boardEnd: z.enum(boardEnds),
  angleDeg: z.coerce.number().min(0).max(90),
  falls: z.enum(["right", "left"]),
});

/** An angle judged by eye is good to some ten degrees: our own estimate. */
const eyeConfidence = 0.5;

export async function loader({ params, context }: Route.LoaderArgs) {
  const { actor } = requireRole(context, "rings:read");
  return { board: requireFound(await getBoard(context.get(dbContext), actor, params.boardId)) };
}

export async function action({ params, request, context }: Route.ActionArgs) {
  const { actor, shop } = requireRole(context, "rings:read");
  const db = context.get(dbContext);
  const board = requireFound(await getBoard(db, actor, params.boardId));
  const parsed = form.safeParse(Object.fromEntries(await request.formData()));
  if (!parsed.success) return data({ why: "An angle is 0 to 90 degrees." }, { status: 400 });
  const { boardEnd, angleDeg, falls } = parsed.data;
  const field = fieldFromAngle(board, angleDeg, falls);
  const reading = {
    boardEnd,
    source: "angle",
    methodVersion: angleMethod,
    photoId: null,
    inputs: { angleDeg, falls },
    field,
    confidence: eyeConfidence,
  } as const;
  if (!(await keepReading(db, actor, board.id, reading, shop.classLimits, systemClock.now()))) notHere();
  return redirect(href("/boards/:boardId", { boardId: board.id }));
}

export default function SetByEye({ loaderData, actionData }: Route.ComponentProps) {
  const { board } = loaderData;
  const { classLimits } = useShop();
  const [angleDeg, setAngle] = useState(Math.round(board.ringMeanDeg ?? 45));
  const [falls, setFalls] = useState<"right" | "left">("right");
  const field = fieldFromAngle(board, angleDeg, falls);
  const width = 900;
  const height = (width * board.thicknessMm) / board.widthMm;
  const ringClass = classOf(angleDeg, classLimits);
  return (
    <>
      <PageHead
        title={`Rings of ${board.tag}, by eye`}
        over={board.place ?? undefined}
        lead="Turn the drawn rings until they lie as they do in front of you."
      />
      <Card className="grid max-w-3xl gap-4">
        {actionData ? <Notice kind="wrong" title={actionData.why} /> : null}
        <svg viewBox={`0 0 ${width} ${height}`} className="block h-auto w-full" role="presentation">
          <EndDrawing
            board={{ ...board, rings: field, ringClass, ringMinDeg: angleDeg, ringMaxDeg: angleDeg }}
            width={width}
            height={height}
          />
        </svg>
        <p className="text-center font-mono text-xl" aria-live="polite">
          {angleDeg}° · {ringClass}
        </p>
        <Form method="post" className="grid gap-5">
          <EyeFields angleDeg={angleDeg} falls={falls} onAngle={setAngle} onFalls={setFalls} />
          <div className="flex flex-wrap gap-3">
            <Button look="main" className="w-full sm:w-auto">
              Keep this angle
            </Button>
            <ButtonLink look="quiet" to={href("/boards/:boardId", { boardId: board.id })}>
              Back to {board.tag}
            </ButtonLink>
          </div>
        </Form>
      </Card>
    </>
  );
}
