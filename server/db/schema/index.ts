export * from "./classroom.ts";
export * from "./event.ts";
export * from "./identity.ts";
export * from "./shows.ts";
