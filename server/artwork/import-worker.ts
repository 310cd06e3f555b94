import type { ImportOutcome } from "#shared/artwork/imported-artwork.ts";
import { answerQuestions } from "../threads/answer-questions.ts";
import { importBytes } from "./import-bytes.ts";
import { isReaderBroken } from "./simplify-svg.ts";

answerQuestions<Uint8Array, ImportOutcome>(importBytes, { isSpent: isReaderBroken });
