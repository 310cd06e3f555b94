import type { Services } from "../http/context.ts";
import { importArtwork } from "./import-artwork.ts";
import { makeCertificateOfDecision } from "./make-certificate.ts";
import type { JobName, JobPayloads } from "./queue.ts";
import { remind } from "./remind.ts";
import { renderProofOfRevision } from "./render-proof.ts";
import { sendMail } from "./send-mail.ts";

/**
 * Does one job. Running it again must change nothing more: a job that was cut off is run again. It throws when it
 * should be tried later; what can't be mended by trying is written to the job's own row instead.
 */
export type Task<N extends JobName> = (services: Services, payload: JobPayloads[N], attempt: Attempt) => Promise<void>;

/** Which try this is. After the last one nobody tries again, so what waits for the job has to be told. */
export type Attempt = { readonly isLast: boolean };

/** Every job the queue knows. */
export const tasks: { readonly [N in JobName]?: Task<N> } = {
  "send-mail": sendMail,
  "import-artwork": importArtwork,
  "render-proof": renderProofOfRevision,
  "make-certificate": makeCertificateOfDecision,
  remind,
};
