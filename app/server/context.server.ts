import type { Knex } from "knex";
import type { Logger } from "pino";
import { createContext } from "react-router";
import type { Actor } from "#app/domain/shop/actor.ts";
import type { ShopSettings } from "#app/domain/shop/shop.ts";
import type { Mailer } from "#app/services/mail.server.ts";
import type { Planner } from "#app/services/planner.server.ts";
import type { RingReader } from "#app/services/ring-reader.server.ts";
import type { Storage } from "#app/services/storage.server.ts";

/** The database handle for this request. Tests hand in a transaction. */
export const dbContext = createContext<Knex>();

/** Where files are kept. */
export const storageContext = createContext<Storage>();

/** What plans boards to cut, beside this process. */
export const plannerContext = createContext<Planner>();

/** What reads rings off photos, beside this process. */
export const ringReaderContext = createContext<RingReader>();

/** How letters are sent. */
export const mailerContext = createContext<Mailer>();

/** The request's own log: every line carries the request id. */
export const logContext = createContext<Logger>();

/** The nonce of this answer's Content-Security-Policy. */
export const nonceContext = createContext<string>();

/** A signed-in person, before any shop is chosen. */
export interface Visit {
  sessionId: string;
  personId: string;
  personName: string;
  email: string;
  /** The shop chosen in this session; null until the person has one. */
  shopId: string | null;
}

/** Who is asking, or null for a stranger. Set by root middleware. */
export const visitContext = createContext<Visit | null>(null);

/** Set by the guard of every shop page: proof of membership. */
export interface AtWork {
  actor: Actor;
  shop: ShopSettings;
}

export const atWorkContext = createContext<AtWork>();
