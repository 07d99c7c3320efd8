import { pino } from "pino";
import { eq } from "drizzle-orm";
import { adminContract } from "../../shared/contracts/admin.ts";
import { systemClock } from "../clock.ts";
import { parseConfig } from "../config.ts";
import { schools } from "../db/schema/index.ts";
import { addStaff } from "../features/admin/admin.service.ts";
import { createSecretHasher } from "../identity/secret-hasher.ts";
import { openDataDir } from "../start-server.ts";
import { type Command, getValue, parseOptions, UsageError } from "./command.ts";
import { notNeeded } from "./no-runs.ts";

/** `user add`: the way to the first admin, and back in when nobody is left. The password comes from the environment. */
export const userAdd: Command = {
  name: "user add",
  usage:
    'user add --name "Ida Fenn" --email ida@school.example --roles admin,coordinator [--school "Tarn Road Middle School"]',
  summary:
    "Adds a staff account. The password is read from DUSKBELL_PASSWORD, so that it stays out of the process list.",
  async run(args, say) {
    const { values, rest } = parseOptions(args, { values: ["name", "email", "roles", "school"] });
    if (rest.length > 0) throw new UsageError(`What is "${rest.join(" ")}"? Put names with spaces into quotes.`);
    const password = process.env.DUSKBELL_PASSWORD;
    if (password === undefined)
      throw new UsageError("DUSKBELL_PASSWORD is missing: set it to the first password, 15 characters at least.");
    const connection = openDataDir(parseConfig(process.env).dataDir);
    try {
      const { db } = connection;
      const schoolName = values.get("school");
      const school =
        schoolName === undefined
          ? null
          : db.select({ id: schools.id }).from(schools).where(eq(schools.name, schoolName)).get();
      if (school === undefined) throw new UsageError(`--school: there is no school "${schoolName}".`);
      const parsed = adminContract.addStaff.body.safeParse({
        displayName: getValue(values, "name", '"Ida Fenn"'),
        email: getValue(values, "email", "ida@school.example"),
        roles: getValue(values, "roles", "teacher").split(","),
        schoolId: school?.id ?? null,
        password,
      });
      if (!parsed.success)
        throw new UsageError(
          parsed.error.issues.map((issue) => `${issue.path.join(".")}: ${issue.message}`).join("\n"),
        );
      const deps = {
        db,
        clock: systemClock,
        hasher: createSecretHasher(),
        log: pino({ level: "silent" }),
        runs: notNeeded,
      };
      const staff = await addStaff(deps, null, parsed.data);
      say(`Added ${staff.displayName} (${staff.email}) as ${staff.roles.join(", ")}.`);
      return 0;
    } finally {
      connection.close();
    }
  },
};
