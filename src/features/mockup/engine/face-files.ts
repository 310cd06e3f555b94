import atkinson700 from "@fontsource/atkinson-hyperlegible/files/atkinson-hyperlegible-latin-700-normal.woff?url";
import bitter700 from "@fontsource/bitter/files/bitter-latin-700-normal.woff?url";
import cinzel600 from "@fontsource/cinzel/files/cinzel-latin-600-normal.woff?url";
import cinzel800 from "@fontsource/cinzel/files/cinzel-latin-800-normal.woff?url";
import josefin600 from "@fontsource/josefin-sans/files/josefin-sans-latin-600-normal.woff?url";
import lobster400 from "@fontsource/lobster/files/lobster-latin-400-normal.woff?url";
import merriweather700 from "@fontsource/merriweather/files/merriweather-latin-700-normal.woff?url";
import merriweather900 from "@fontsource/merriweather/files/merriweather-latin-900-normal.woff?url";
import merriweatherSans700 from "@fontsource/merriweather-sans/files/merriweather-sans-latin-700-normal.woff?url";
import montserrat600 from "@fontsource/montserrat/files/montserrat-latin-600-normal.woff?url";
import montserrat800 from "@fontsource/montserrat/files/montserrat-latin-800-normal.woff?url";
import oswald500 from "@fontsource/oswald/files/oswald-latin-500-normal.woff?url";
import oswald700 from "@fontsource/oswald/files/oswald-latin-700-normal.woff?url";
import stardos700 from "@fontsource/stardos-stencil/files/stardos-stencil-latin-700-normal.woff?url";

/** Where the file of each face is served, by the face's key. It is fetched when words are set in it. */
export const faceFiles: ReadonlyMap<string, string> = new Map([
  ["montserrat-600", montserrat600],
  ["montserrat-800", montserrat800],
  ["atkinson-hyperlegible-700", atkinson700],
  ["merriweather-sans-700", merriweatherSans700],
  ["josefin-sans-600", josefin600],
  ["oswald-500", oswald500],
  ["oswald-700", oswald700],
  ["bitter-700", bitter700],
  ["merriweather-700", merriweather700],
  ["merriweather-900", merriweather900],
  ["cinzel-600", cinzel600],
  ["cinzel-800", cinzel800],
  ["lobster-400", lobster400],
  ["stardos-stencil-700", stardos700],
]);
