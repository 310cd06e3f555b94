import { expect, it } from "vitest";
import { deviceName } from "@/features/account/components/device-name.ts";

it.each([
  { agent: "X/5.0 (Some; CPU) Y/605 (KHTML) Mobile/15E148", name: "A phone or tablet" },
  { agent: "X/5.0 (Something; Tablet; rv:1) Y/1", name: "A phone or tablet" },
  { agent: "X/5.0 (A; B x86_64) Y/140", name: "A computer" },
  { agent: "", name: "An unnamed browser" },
])("$agent is $name", ({ agent, name }) => {
  expect(deviceName(agent)).toBe(name);
});
