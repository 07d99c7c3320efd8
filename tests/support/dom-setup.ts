import { cleanup } from "@testing-library/react";
import { afterEach } from "vitest";

// Vitest runs without globals here, so the library cannot register its own clean-up.
afterEach(cleanup);
