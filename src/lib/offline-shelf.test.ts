import "fake-indexeddb/auto";
import { afterEach, describe, expect, it } from "vitest";
import { ApiProblem } from "./api-client.ts";
import { askOrRecall, clearShelf } from "./offline-shelf.ts";

const offline = (): Promise<{ title: string }> => Promise.reject(new ApiProblem("offline", 0, null));

afterEach(clearShelf);

describe("askOrRecall", () => {
  it("gives the server's answer, and what it said last when there is none", async () => {
    expect(await askOrRecall("song", () => Promise.resolve({ title: "Frost Fair" }))).toEqual({ title: "Frost Fair" });
    await expect.poll(() => askOrRecall("song", offline).catch(() => null)).toMatchObject({ title: "Frost Fair" });
    expect((await askOrRecall("song", offline)).keptAt).toBeTypeOf("number");
  });

  it("passes other refusals on, also when something is kept", async () => {
    await askOrRecall("show", () => Promise.resolve({ title: "Lanterns" }));
    const refuse = () => Promise.reject(new ApiProblem("not-found", 404, null));
    await expect(askOrRecall("show", refuse)).rejects.toMatchObject({ slug: "not-found" });
  });

  it("has nothing left when it was cleared, and says that the server is away", async () => {
    await askOrRecall("show", () => Promise.resolve({ title: "Lanterns" }));
    await expect.poll(() => askOrRecall("show", offline).catch(() => null)).toMatchObject({ title: "Lanterns" });
    await clearShelf();
    await expect(askOrRecall("show", offline)).rejects.toMatchObject({ slug: "offline" });
  });
});
