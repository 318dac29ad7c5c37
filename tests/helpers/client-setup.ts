import "@testing-library/jest-dom/vitest";
import { cleanup, configure } from "@testing-library/react";
import "fake-indexeddb/auto";
import { afterEach } from "vitest";

// A machine under load is slow, not wrong.
configure({ asyncUtilTimeout: 15_000 });

afterEach(cleanup);
