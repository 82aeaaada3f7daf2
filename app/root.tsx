import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { type ReactNode, useState } from "react";
import { RouterProvider } from "react-aria-components";
import { Links, Outlet, Scripts, ScrollRestoration, useHref, useNavigate, useRouteLoaderData } from "react-router";
import type { Route } from "./+types/root.ts";
import { ErrorPage } from "./components/error-page.tsx";
import { outside, requestLog, securityHeaders } from "./server/middleware.server.ts";
import { readTheme } from "./server/theme.server.ts";
import { findVisitor } from "./server/visit.server.ts";
import "./styles/app.css";

export const middleware: Route.MiddlewareFunction[] = [requestLog, securityHeaders, outside, findVisitor];

export async function loader({ request }: Route.LoaderArgs) {
  return { theme: await readTheme(request) };
}

export function Layout({ children }: { children: ReactNode }) {
  const theme = useRouteLoaderData<typeof loader>("root")?.theme;
  return (
    <html lang="en" data-theme={theme}>
      <head>
        <meta charSet="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <meta name="theme-color" content="#22382f" />
        <link rel="icon" href="/icon.svg" type="image/svg+xml" />
        <Links />
      </head>
      <body>
        {children}
        <ScrollRestoration />
        <Scripts />
      </body>
    </html>
  );
}

export default function Root() {
  const navigate = useNavigate();
  // One cache a person and page load: at module level it would be shared between people on the server.
  const [queries] = useState(() => new QueryClient({ defaultOptions: { queries: { staleTime: 10_000 } } }));
  return (
    <QueryClientProvider client={queries}>
      <RouterProvider navigate={navigate} useHref={useHref}>
        <Outlet />
      </RouterProvider>
    </QueryClientProvider>
  );
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  return <ErrorPage error={error} />;
}
