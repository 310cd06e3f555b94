/** Colours of a letter on a light ground. Mail programs know no variables, so they stand on the elements themselves. */
export const tones = {
  page: "#FBF8F1",
  sheet: "#FFFFFF",
  ink: "#1F1D1A",
  faint: "#57524A",
  rule: "#D8CFBD",
  seal: "#96372B",
  onSeal: "#FFFFFF",
} as const;

/** The same letter on a dark ground, for programs that ask for it, and on a narrow screen. */
export const letterStyle = `
:root { color-scheme: light dark; supported-color-schemes: light dark; }
@media (max-width: 480px) {
  .page { padding: 0 !important; }
  .letter { padding: 18px 16px !important; border-left: 0 !important; border-right: 0 !important; }
  .button { display: block !important; text-align: center !important; }
}
@media (prefers-color-scheme: dark) {
  .page { background: #191714 !important; color: #f1ebdf !important; }
  .letter { background: #24211d !important; border-color: #4b453c !important; }
  .sender { border-color: #f1ebdf !important; }
  .quote, .note, .stop { border-color: #5a5348 !important; }
  .faint { color: #b9b0a2 !important; }
  .button { background: #a8483b !important; color: #ffffff !important; }
}
`;
