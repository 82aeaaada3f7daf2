import type { ReactNode } from "react";
import { Button as AriaButton, Menu, MenuItem, MenuTrigger, Popover, Separator } from "react-aria-components";
import { Link, NavLink } from "react-router";

interface ShopHeaderProps {
  shopName: string;
  personName: string;
  role: string;
  /** What this role is led to; each page asks again. */
  sees: { deliveries: boolean; settings: boolean; people: boolean };
  /** The box for finding a board. */
  find?: ReactNode;
}

/** The iron bar across the top: where one can go, a box to find a board by tag, and who is at work where. */
export function ShopHeader({ shopName, personName, role, sees, find }: ShopHeaderProps) {
  return (
    <header className="bg-bar text-bar-ink" data-screen-only>
      <a
        href="#content"
        className="sr-only focus:not-sr-only focus:absolute focus:z-10 focus:bg-action focus:p-3 focus:text-action-ink"
      >
        Skip to the page
      </a>
      <div className="mx-auto flex max-w-[84rem] flex-wrap items-center gap-x-2 gap-y-2 px-4 sm:gap-x-4 py-2.5">
        <Link to="/rack" className="flex items-center gap-2 font-bold font-display text-xl text-bar-ink no-underline">
          <img src="/icon.svg" alt="" className="h-8 w-8" />
          Rayfleck
        </Link>
        <div className="order-2 ml-auto flex items-center gap-1.5 md:order-3">
          <Link
            to="/scan"
            className="inline-flex min-h-11 items-center rounded-full border border-bar-soft px-3.5 font-semibold text-bar-ink no-underline hover:bg-bar-chosen"
          >
            Scan
          </Link>
          <PersonMenu {...{ shopName, personName, role, sees }} />
        </div>
        <nav
          aria-label="Shop"
          className="order-3 -mx-4 flex w-[calc(100%+2rem)] gap-1 overflow-x-auto px-4 md:order-2 md:mx-0 md:w-auto md:px-0"
        >
          <Tab to="/rack">Rack</Tab>
          <Tab to="/boards">Boards</Tab>
          {sees.deliveries ? <Tab to="/deliveries">Deliveries</Tab> : null}
          <Tab to="/projects">Projects</Tab>
          <Tab to="/calculators">Calculators</Tab>
        </nav>
        <div className="order-4 w-full md:order-2 md:ml-auto md:w-40 lg:w-64">{find}</div>
      </div>
    </header>
  );
}

function Tab({ to, children }: { to: string; children: string }) {
  return (
    <NavLink
      to={to}
      className={({ isActive }) =>
        `inline-flex min-h-11 shrink-0 items-center rounded-lg px-2.5 lg:px-3.5 text-bar-ink no-underline hover:bg-bar-chosen ${isActive ? "bg-bar-chosen font-semibold" : ""}`
      }
    >
      {children}
    </NavLink>
  );
}

const item =
  "flex min-h-11 cursor-pointer items-center rounded-md px-3 text-ink no-underline outline-none data-focused:bg-sunk data-focused:underline";

function PersonMenu({ shopName, personName, role, sees }: ShopHeaderProps) {
  return (
    <MenuTrigger>
      <AriaButton className="inline-flex min-h-11 max-w-28 items-center sm:max-w-48 rounded-full bg-bar-chosen px-4 text-bar-ink">
        <span className="truncate">{shopName}</span>
      </AriaButton>
      <Popover placement="bottom end" className="min-w-60 rounded-xl border border-line bg-surface p-2 shadow-lg">
        <p className="px-3 py-2 text-ink-soft text-sm">
          {personName}, {role}
        </p>
        <Menu aria-label="You and your shop" className="outline-none">
          {sees.settings ? (
            <MenuItem href="/settings" className={item}>
              Shop settings
            </MenuItem>
          ) : null}
          {sees.people ? (
            <MenuItem href="/people" className={item}>
              People
            </MenuItem>
          ) : null}
          {sees.deliveries ? (
            <MenuItem href="/suppliers" className={item}>
              Suppliers
            </MenuItem>
          ) : null}
          <Separator className="my-1 border-line border-t" />
          <MenuItem href="/account" className={item}>
            Your account
          </MenuItem>
          <MenuItem href="/shops" className={item}>
            Change shop
          </MenuItem>
        </Menu>
      </Popover>
    </MenuTrigger>
  );
}
