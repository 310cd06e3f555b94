import { makeCertificate } from "../commands/make-certificate.ts";
import type { Services } from "../http/context.ts";

/** Makes the certificate of an approval. */
export async function makeCertificateOfDecision(
  services: Services,
  { decisionId }: { decisionId: string },
): Promise<void> {
  await services.sequelize.transaction((transaction) =>
    makeCertificate({ services, transaction, now: new Date() }, { decisionId }),
  );
}
