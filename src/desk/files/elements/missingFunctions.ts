import { futureFunctions } from "../futureFunctions.ts";
import { functionsIn } from "../storedFormulas.ts";

/** Functions that LibreOffice 7.4 answers with #NAME?, in the spelling that Excel saves; found by opening each there. */
const missing: ReadonlySet<string> = new Set(
  `ANCHORARRAY ARRAYTOTEXT BINOM.DIST.RANGE BYCOL BYROW CHOOSECOLS CHOOSEROWS DROP ECMA.CEILING EXPAND FIELDVALUE FILTER HSTACK
  IMCOSH IMCOT IMCSC IMCSCH IMSEC IMSECH IMSINH IMTAN ISO.CEILING ISOMITTED LAMBDA LET MAKEARRAY MAP NETWORKDAYS.INTL RANDARRAY
  REDUCE SCAN SEQUENCE SINGLE SORT SORTBY TAKE TEXTAFTER TEXTBEFORE TEXTSPLIT TOCOL TOROW UNIQUE VALUETOTEXT VSTACK WORKDAY.INTL
  WRAPCOLS WRAPROWS XLOOKUP XMATCH`.split(/\s+/),
);

/** Whether LibreOffice cannot calculate a formula: it calls an add-in, or a function that is not known there. */
export const isMissingInLibreOffice = (formula: string): boolean =>
  functionsIn(formula).some((name) => missing.has(name) || isOfAddIn(name));

/** The one function with a dot that the file format has known from its beginning. */
const olderWithDot = "ERROR.TYPE";

const isOfAddIn = (name: string): boolean =>
  name.startsWith("_") || (name.includes(".") && name !== olderWithDot && !futureFunctions.has(name));
