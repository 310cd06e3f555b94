import { answerQuestions } from "../threads/answer-questions.ts";
import { type ImportedFile, type ImportQuestion, importBytes } from "./import-bytes.ts";
import { isReaderBroken } from "./simplify-svg.ts";

answerQuestions<ImportQuestion, ImportedFile>(({ bytes, choices }) => importBytes(bytes, choices), {
  isSpent: isReaderBroken,
});
