import type { Frame } from "../../frame/lay-out-frame.ts";
import { countOf } from "../../mockup/change.ts";
import { type SawSetting, type sawSettings, settingsBeyond } from "../../slats/saw-settings.ts";
import type { SlatCut } from "../../slats/slat-layout.ts";
import { frameOf, slatsOf } from "../../stack/backer.ts";
import type { Finding } from "../finding.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";

const source = "plane geometry; how far the saw turns is the shop's";

/** Rule 33: no cut of slats or frame that must fit asks more of the saw than it turns. */
export const sawSetting: Rule = { number: 33, title: "Saw setting", check };

function check(input: RuleInput): Finding[] {
  return [...checkSlats(input), ...checkFrame(input)];
}

function checkSlats({ document, limits, kernel }: RuleInput): Finding[] {
  const laid = slatsOf(document, kernel);
  if (!laid?.ok) return [];
  const { slats } = laid.value;
  const most = limits.sawSettingMost;
  const beyond = settingsBeyond(slats, most);
  const [steepest] = beyond;
  if (!steepest) return [];
  const cuts = beyond.reduce((sum, { fitting }) => sum + fitting, 0);
  const isBeyond = ({ mustFit, setting }: SlatCut) => mustFit && setting > most;
  const first = slats.find((slat) => [...slat.near, ...slat.far].some(isBeyond));
  const atSpine = slats.some(({ near, far }) => [...near, ...far].some((cut) => isBeyond(cut) && cut.edge === "spine"));
  const way = atSpine
    ? `Stand the slats at ${Number((90 - most).toFixed(1))}° to the spine or more, or cut them on a jig.`
    : "Lay the slats past the edge and trim them flush, or cut them on a jig.";
  return [beyondSaw(`${cutsWords(cuts)} of slats`, steepest, way, first?.axis.from ?? null, most)];
}

function checkFrame({ document, limits, kernel }: RuleInput): Finding[] {
  const round = frameOf(document, kernel);
  if (!round?.ok) return [];
  const most = limits.sawSettingMost;
  const ends = round.value.members.map(endsOf);
  const beyond = settingsBeyond(ends, most);
  const [steepest] = beyond;
  if (!steepest) return [];
  const cuts = beyond.reduce((sum, { fitting }) => sum + fitting, 0);
  const first = round.value.members.find(({ settings }) => settings.some((setting) => setting > most));
  const way = "Butt the corner, blunt it, or cut it on a jig.";
  return [beyondSaw(`${cutsWords(cuts)} of the frame`, steepest, way, first?.from ?? null, most)];
}

type Ends = Parameters<typeof sawSettings>[0][number];

/** A frame's piece as slats are cut: both its ends show. */
function endsOf({ settings: [start, end] }: Frame["members"][number]): Ends {
  const cut = (setting: number) => [{ edge: "outline" as const, setting, mustFit: true }];
  return { near: cut(start), far: cut(end) };
}

function beyondSaw(what: string, { setting }: SawSetting, way: string, where: Finding["where"], most: number): Finding {
  return foundBy(sawSetting, {
    severity: "stop",
    text: `${what} must fit and ask for ${setting}° off a square cut; the saw turns to ${most}°. ${way}`,
    where,
    value: setting,
    limit: most,
    unit: "°",
    source,
  });
}

const cutsWords = (cuts: number): string => countOf(cuts, "cut");
