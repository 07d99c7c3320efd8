import { describe, expect, it } from "vitest";
import { listMessages } from "./messages.ts";
import { RIGHT_SCRIPTS } from "./right-scripts.ts";

describe("sixty right scripts as beginners write them", () => {
  it("are sixty, five for each of twelve lessons", () => {
    const perLesson = Array.from(
      { length: 12 },
      (_, i) => RIGHT_SCRIPTS.filter(({ lesson }) => lesson === i + 1).length,
    );
    expect(perLesson).toEqual(Array.from({ length: 12 }, () => 5));
    expect(RIGHT_SCRIPTS).toHaveLength(60);
  });

  it.each(RIGHT_SCRIPTS)("lesson $lesson, $name: nothing is said about it", async ({ source }) => {
    expect(await listMessages(source)).toEqual([]);
  });
});
