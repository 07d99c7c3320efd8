import type { Page } from "playwright-core";
import { demoStudent, STAFF } from "../../../server/db/seed/world/people.ts";

/** A student of the demo world with shows in several states. */
export const STUDENT = "7B-TARN/wren";
/** The teacher of that class, the event's coordinator, the admin: keys of staff. */
export const TEACHER = "marlow";
export const COORDINATOR = "holm";
export const ADMIN = "quist";

/** Signs a student in by the form, with the words of their card. */
export async function signInStudent(page: Page, key = STUDENT): Promise<void> {
  const { classCode, username, passphrase } = demoStudent(key);
  await page.goto("/sign-in?as=student");
  await page.getByLabel("Class code").fill(classCode);
  await page.getByLabel("Username").fill(username);
  await page.getByLabel("Your four words").fill(passphrase.replaceAll("-", " "));
  await page.getByRole("button", { name: "Sign in" }).click();
  await page.waitForURL("**/home");
}

/** Signs a member of staff in by the form. */
export async function signInStaff(page: Page, key: string): Promise<void> {
  const person = STAFF.find((each) => each.key === key);
  if (!person) throw new RangeError(`The demo world has no staff "${key}".`);
  await page.goto("/sign-in?as=staff");
  await page.getByLabel("E-mail address").fill(person.email);
  await page.getByLabel("Password", { exact: true }).fill(person.password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await page.waitForURL((url) => url.pathname !== "/sign-in");
}

/** Whoever opens a page in a test. */
export type Visitor = "student" | "teacher" | "coordinator" | "admin" | "nobody";

/** Signs in the demo world's person of that kind; nobody stays signed out. */
export async function signInAs(page: Page, visitor: Visitor): Promise<void> {
  if (visitor === "student") await signInStudent(page);
  if (visitor === "teacher") await signInStaff(page, TEACHER);
  if (visitor === "coordinator") await signInStaff(page, COORDINATOR);
  if (visitor === "admin") await signInStaff(page, ADMIN);
}
