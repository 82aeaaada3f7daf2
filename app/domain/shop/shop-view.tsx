import { createContext, type ReactNode, use } from "react";
import type { LengthUnit } from "#app/core/lengths/parse-length.ts";
import type { ClassLimits } from "#app/core/rings/ring-types.ts";
import type { Role } from "./permissions.ts";

/** What drawings and figures of a shop's pages need to know: how it writes sizes and money, where its ring classes end, and whose eyes these are. */
export interface ShopView {
  name: string;
  units: LengthUnit;
  currency: string;
  classLimits: ClassLimits;
  role: Role;
}

const ShopViewContext = createContext<ShopView | null>(null);

/** Set once by the shop's layout, for every page under it. */
export function ShopViewProvider({ value, children }: { value: ShopView; children: ReactNode }) {
  return <ShopViewContext value={value}>{children}</ShopViewContext>;
}

/** The shop this page belongs to. @throws outside a shop's layout: a bug. */
export function useShop(): ShopView {
  const shop = use(ShopViewContext);
  if (!shop) throw new Error("useShop outside a shop's pages");
  return shop;
}
