import { index, layout, prefix, type RouteConfig, route } from "@react-router/dev/routes";

export default [
  index("routes/home.ts"),
  layout("routes/shop/layout.tsx", [
    route("rack", "routes/rack/rack.tsx"),
    route("rack/bays/new", "routes/rack/new-bay.tsx"),
    ...prefix("boards", [
      index("routes/boards/list.tsx"),
      route(":boardId", "routes/boards/board.tsx", [
        route("correct/:group", "routes/boards/correct.tsx"),
        route("moisture", "routes/boards/moisture.tsx"),
        route("move", "routes/boards/move.tsx"),
        route("defects", "routes/boards/defects.tsx"),
      ]),
      route(":boardId/reserve", "routes/boards/reserve.tsx"),
      route(":boardId/rings/by-eye", "routes/rings/by-eye.tsx"),
      route(":boardId/rings/:photoId", "routes/rings/mark.tsx"),
      route(":boardId/state", "routes/boards/state.ts"),
      route(":boardId/delete", "routes/boards/delete.tsx"),
      route(":boardId/photos/:photoId/remove", "routes/boards/remove-photo.ts"),
    ]),
    route("holds/:holdId", "routes/holds/hold.ts"),
    route("scan", "routes/scan/scan.tsx"),
    route("tags", "routes/tags/tags.tsx"),
    ...prefix("projects", [
      index("routes/projects/list.tsx"),
      route("new", "routes/projects/new.tsx"),
      route(":projectId", "routes/projects/project.tsx", [
        route("change", "routes/projects/change.tsx"),
        route("parts", "routes/projects/parts.tsx"),
      ]),
    ]),
    ...prefix("files", [
      route("boards.csv", "routes/files/boards-csv.ts"),
      route("tags.pdf", "routes/files/tags-pdf.ts"),
      route("photos/:photoId/:size", "routes/files/photo.ts"),
    ]),
  ]),
  layout("routes/api/layout.ts", [
    ...prefix("api", [
      route("boards", "routes/api/find-boards.ts"),
      route("boards/:boardId/availability", "routes/api/availability.ts"),
      route("boards/:boardId/photos", "routes/api/begin-photo.ts"),
      route("photos/:photoId/confirm", "routes/api/confirm-photo.ts"),
    ]),
  ]),
  route("*", "routes/not-here.tsx"),
] satisfies RouteConfig;
