import { expect, it } from "vitest";
import { withoutSecrets } from "#server/http/without-secrets.ts";

const token = "A1b2-_C3d4E5f6G7h8I9j0K1l2M3n4O5p6Q7r8S9t0U";

it.each([
  { text: `/link/${token}`, shown: "/link/[token]" },
  { text: "/unsubscribe/broken-off", shown: "/unsubscribe/[token]" },
  { text: "/link/broken-off", shown: "/link/[token]" },
  { text: `/api/share/${token}?from=mail`, shown: "/api/share/[token]?from=mail" },
  {
    text: `/auth/callback/link?token=${token}&csrfToken=abc`,
    shown: "/auth/callback/link?token=[hidden]&csrfToken=[hidden]",
  },
  { text: `Mail to http://h/link/${token} failed`, shown: "Mail to http://h/link/[token] failed" },
  { text: `said ${token}.`, shown: "said [token]." },
  { text: "/api/shops/copperlark-signs/jobs?q=oars", shown: "/api/shops/copperlark-signs/jobs?q=oars" },
  {
    text: "/api/shops/x/clients/5b0a2f4e-6a3c-4a51-9f0b-6d1f2f3a4b5c",
    shown: "/api/shops/x/clients/5b0a2f4e-6a3c-4a51-9f0b-6d1f2f3a4b5c",
  },
])("$text is logged as $shown", ({ text, shown }) => {
  expect(withoutSecrets(text)).toBe(shown);
});
