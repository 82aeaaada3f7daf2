import { Link, useLocation, useSearchParams } from "react-router";
import { type Crayon, ProjectMark } from "#app/components/crayon.tsx";
import type { BoardSummary } from "#app/domain/boards/board.ts";

export interface RackFilterState {
  rings: string | null;
  project: string | null;
  free: boolean;
  /** Does a board match all that is chosen? Those that do not are drawn faint. */
  matches: (board: BoardSummary) => boolean;
}

/** What of the rack is picked out, from the page's address. */
export function readRackFilter(params: URLSearchParams): RackFilterState {
  const rings = params.get("rings");
  const project = params.get("project");
  const free = params.get("free") === "yes";
  return {
    rings,
    project,
    free,
    matches: (board) =>
      (rings === null || board.ringClass === rings) &&
      (project === null || board.holds.some((hold) => hold.projectId === project)) &&
      (!free || board.holds.length === 0),
  };
}

interface RackFilterProps {
  filter: RackFilterState;
  projects: { projectId: string; projectName: string; crayon: Crayon }[];
}

/** Pick-outs over the rack: one press picks, the next lets go. Plain links, so each has an address. */
export function RackFilter({ filter, projects }: RackFilterProps) {
  return (
    <nav aria-label="Pick out boards" className="flex flex-wrap gap-2">
      {["flat", "rift", "quartered"].map((rings) => (
        <Choice key={rings} name="rings" value={rings} on={filter.rings === rings}>
          {rings}
        </Choice>
      ))}
      <Choice name="free" value="yes" on={filter.free}>
        nothing reserved
      </Choice>
      {projects.map((project) => (
        <Choice
          key={project.projectId}
          name="project"
          value={project.projectId}
          on={filter.project === project.projectId}
        >
          <ProjectMark name={project.projectName} crayon={project.crayon} />
        </Choice>
      ))}
    </nav>
  );
}

interface ChoiceProps {
  name: string;
  value: string;
  on: boolean;
  children: React.ReactNode;
}

function Choice({ name, value, on, children }: ChoiceProps) {
  const [params] = useSearchParams();
  const { pathname } = useLocation();
  const next = new URLSearchParams(params);
  if (on) next.delete(name);
  else next.set(name, value);
  return (
    <Link
      to={`${pathname}?${next}`}
      preventScrollReset
      aria-current={on ? "true" : undefined}
      className={`inline-flex min-h-11 items-center rounded-full border px-4 text-ink no-underline ${
        on ? "border-2 border-action bg-surface font-semibold" : "border-line-strong bg-surface hover:bg-sunk"
      }`}
    >
      {children}
    </Link>
  );
}
