import { Form, href, useNavigate } from "react-router";
import { Button } from "#app/components/button.tsx";
import { Card, PageHead } from "#app/components/card.tsx";
import { TextField } from "#app/components/field.tsx";
import { boardPathOf } from "#app/domain/tags/board-path.ts";
import { TagReader } from "#app/domain/tags/tag-reader.tsx";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/scan.ts";

export function loader({ context }: Route.LoaderArgs) {
  requireRole(context, "board:see");
  return {};
}

export default function Scan() {
  const navigate = useNavigate();
  return (
    <div className="mx-auto grid max-w-xl gap-4">
      <PageHead
        title="Scan a tag"
        lead="Hold the camera over the code; the board opens by itself. Any phone's own camera does the same."
      />
      <TagReader
        onRead={(text) => {
          const path = boardPathOf(text);
          if (path) navigate(path);
          return path !== null;
        }}
      />
      <Card title="Or type it">
        <Form action={href("/boards")} className="flex items-end gap-3">
          <TextField label="Tag number" name="q" hint="142, or WO-0142." autoComplete="off" className="flex-1" />
          <input type="hidden" name="state" value="any" />
          <Button look="main" className="mb-7">
            Find
          </Button>
        </Form>
      </Card>
    </div>
  );
}
