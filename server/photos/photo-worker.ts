import { answerQuestions } from "../threads/answer-questions.ts";
import { type PreparedBytes, prepareBytes } from "./prepare-bytes.ts";

answerQuestions<Uint8Array, PreparedBytes>(prepareBytes);
