/** What kind of device a browser's own description speaks of: browsers on hand-held ones put "Mobi" or "Tablet" in it. */
export const deviceName = (agent: string): string =>
  /mobi|tablet/i.test(agent) ? "A phone or tablet" : agent === "" ? "An unnamed browser" : "A computer";
