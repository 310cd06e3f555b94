/**
 * Currencies by the digits of their minor unit, as ISO 4217 lists them (list one, confirmed in a public copy; SLE from
 * memory). Codes for metals, funds and tests are left out.
 */
const codesByDigits: Readonly<Record<number, string>> = {
  0: "BIF CLP DJF GNF ISK JPY KMF KRW PYG RWF UGX VND VUV XAF XOF XPF",
  2: [
    "AED AFN ALL AMD ANG AOA ARS AUD AWG AZN BAM BBD BDT BGN BMD BND BOB BRL BSD BTN BWP BYN BZD CAD CDF CHF CNY COP",
    "CRC CUP CVE CZK DKK DOP DZD EGP ERN ETB EUR FJD FKP GBP GEL GHS GIP GMD GTQ GYD HKD HNL HTG HUF IDR ILS INR IRR",
    "JMD KES KGS KHR KPW KYD KZT LAK LBP LKR LRD LSL MAD MDL MGA MKD MMK MNT MOP MRU MUR MVR MWK MXN MYR MZN NAD NGN",
    "NIO NOK NPR NZD PAB PEN PGK PHP PKR PLN QAR RON RSD RUB SAR SBD SCR SDG SEK SGD SHP SLE SOS SRD SSP STN SVC SYP",
    "SZL THB TJS TMT TOP TRY TTD TWD TZS UAH USD UYU UZS VES WST XCD YER ZAR ZMW",
  ].join(" "),
  3: "BHD IQD JOD KWD LYD OMR TND",
};

const digitsByCode = new Map(
  Object.entries(codesByDigits).flatMap(([digits, codes]) => codes.split(" ").map((code) => [code, Number(digits)])),
);

/** Digits of a currency's minor unit: 2 where 100 make one. Null for a code that isn't on the list. */
export function currencyDigits(code: string): number | null {
  return digitsByCode.get(code) ?? null;
}

/** Every code on the list, in order. */
export const currencyCodes: readonly string[] = [...digitsByCode.keys()].sort();
