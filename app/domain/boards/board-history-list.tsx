import { Card } from "#app/components/card.tsx";
import { When } from "#app/components/when.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { type BoardEvent, eventTitle, eventWords } from "./board-history.ts";

/** What happened to a board, newest first: never edited, only added to. */
export function BoardHistory({ events }: { events: BoardEvent[] }) {
  const { units } = useShop();
  return (
    <Card title="History" className="order-last lg:order-none">
      <ol className="grid gap-3">
        {events.map((event) => (
          <li key={event.id} className="grid gap-0.5 border-line border-l-2 pl-3">
            <p>
              <span className="font-semibold">{eventTitle(event.kind)}</span>
              {eventWords(event.detail, units) ? <span>: {eventWords(event.detail, units)}</span> : null}
            </p>
            <p className="text-ink-soft text-sm">
              {event.byName ?? "Rayfleck"}, <When at={event.at} />
            </p>
          </li>
        ))}
      </ol>
    </Card>
  );
}
