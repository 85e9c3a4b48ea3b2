import type { Quantity } from "../claim.ts";

/** What the numbers below, or beside, a heading are. */
export type TermWord = Extract<Quantity, { readonly term: number | null }>["kind"];

/** What a number of the whole regression is. */
export type SummaryWord = Exclude<Quantity["kind"], TermWord | "prediction">;

/** Headings as the trade spells them, brought into small letters with single blanks by `plain`. */
const termWords: Readonly<Record<TermWord, RegExp>> = {
  coefficient:
    /^(?:(?:regression |ols |unstandardi[sz]ed )?(?:coef|coeff|coefs|coeffs|coefficient|coefficients)(?: \(?(?:b|beta|estimate)\)?)?|b|beta|estimate|estimates|est|parameter|parameters|parameter estimates?|slope|slopes|effect|effect size)$/,
  "standard-error":
    /^(?:(?:robust|white|hac|newey[ -]west|clustered|classical|usual) )?(?:(?:std|stand|standard)(?: ?err|\.? error|\.? errors|\.? err)s?|s\.? ?e|ses|se ?\(? ?(?:b|coef|coefficient|beta)\)?|stderr)(?: \((?:robust|hc[0-5]|white|hac|newey[ -]west|clustered|classical)\))?$/,
  ratio: /^(?:[tz]|[tz][ -]?(?:stat|stats|statistic|statistics|ratio|ratios|value|values|score)|ratio)$/,
  "p-value":
    /^(?:p|p[ -]?values?|sig|significance|prob|probability|(?:p|pr|prob) ?\(? ?> ?\|? ?[tz] ?\|? ?\)?|p ?\([tz]\))$/,
  low: /^(?:low|lower|lower (?:bound|limit|end|ci|cl|9\d(?:\.\d)? ?%)|ci low(?:er)?|(?:lower|low) ?\(?9\d ?%\)?|9\d ?%? ?(?:ci )?low(?:er)?|2\.5 ?%|from)$/,
  high: /^(?:high|upper|upper (?:bound|limit|end|ci|cl|9\d(?:\.\d)? ?%)|ci (?:high|upp)(?:er)?|(?:upper|high) ?\(?9\d ?%\)?|9\d ?%? ?(?:ci )?(?:high|upper)|97\.5 ?%|to)$/,
};

const summaryWords: Readonly<Record<SummaryWord, RegExp>> = {
  "r-squared":
    /^(?:r[ ^-]?2|r[ -]?sq|r[ -]?sqr|r[ -]?squared?|rsq|coefficient of determination)(?: \(?unadjusted\)?)?$/,
  "adjusted-r-squared":
    /^(?:(?:adj|adj\.|adjusted|corrected) r[ ^-]?(?:2|sq|squared?)|r[ ^-]?(?:2|sq|squared?),? \(?(?:adj|adj\.|adjusted|corrected)\)?)$/,
  correlation: /^(?:r|correlation|correl|correlation coefficient|pearson(?:'s)? r)$/,
  observations:
    /^(?:n|n obs|obs|observations?|no\.? (?:of )?obs(?:ervations)?|num(?:ber)?\.? (?:of )?(?:obs|observations|rows|cases|data points|months|periods|weeks)|sample(?: size)?|rows|cases|count|rows used|data points)$/,
  sigma:
    /^(?:s|sigma|σ|ser|rmse|root mse|s\.? ?e\.? of (?:the )?(?:regression|estimate)|(?:regression|residual) (?:standard|std\.?) (?:error|deviation)|(?:standard|std\.?) error(?: of (?:the )?(?:regression|estimate|residuals?))?|standard deviation of (?:the )?residuals)$/,
  f: /^(?:f|f[ -]?(?:stat|statistic|value|ratio|test))$/,
  "f-p-value":
    /^(?:significance (?:of )?f|sig\.? (?:of )?f|p ?\(f\)|p[ -]?value (?:of |for )?(?:the )?\(?f(?:[ -](?:test|statistic))?\)?|f p[ -]?value|prob(?:ability)?\.? ?(?:>|\() ?f(?:[ -]statistic)?\)?)$/,
  "degrees-of-freedom": /^(?:d\.?f|degrees of freedom|(?:residual|error) (?:d\.?f|degrees of freedom))$/,
  "explained-sum-of-squares":
    /^(?:(?:explained|regression|model) (?:sum of squares|ss)|ss (?:regression|model|explained))$/,
  "residual-sum-of-squares":
    /^(?:rss|(?:residual|error|unexplained) (?:sum of squares|ss)|ss (?:residuals?|error)|sum of squared (?:residuals|errors))$/,
};

const constantWords = /^(?:\(?(?:const|constant|intercept|y[ -]intercept|cons|_cons|constant term|b0|a)\)?)$/;

const outcomeWords =
  /^(?:dependent(?: variable)?|dep\.? var(?:iable)?|outcome|response(?: variable)?|explained variable|left[ -]hand variable|y(?:[ -]variable)?)\s*(?:[:=]\s*(.+))?$/i;

const plain = (text: string): string =>
  text
    .toLowerCase()
    .replaceAll("²", "2")
    .replaceAll(/[_\s]+/g, " ")
    .replace(/^[\s"']+|[\s"':.=]+$/g, "");

const wordIn = <Word extends string>(words: Readonly<Record<Word, RegExp>>) => {
  const entries = Object.entries(words) as [Word, RegExp][];
  return (text: string): Word | null => {
    const sought = plain(text);
    return sought.length > longest ? null : (entries.find(([, pattern]) => pattern.test(sought))?.[0] ?? null);
  };
};

/** Longer texts are sentences. */
const longest = 48;

/** What a heading says of the numbers under it. */
export const termWordIn = wordIn(termWords);

/** Whether a heading says that intervals stand under it, both ends in one cell or in two: "95 % CI", "[95% conf. interval]". */
export const isIntervalHeading = (text: string): boolean =>
  intervalWords.test(
    plain(text)
      .replaceAll(/[[\]()]/g, "")
      .trim(),
  );

const intervalWords =
  /^(?:9\d(?:[.,]\d)? ?(?:%|per ?cent) ?)?(?:c\.?i|conf(?:idence)?\.? ?(?:int(?:erval|ervals)?|limits|bounds|range)|intervals?|bounds)\.?(?:,? ?9\d(?:[.,]\d)? ?(?:%|per ?cent))?$/;

/** What a word beside a number says of it. */
export const summaryWordIn = wordIn(summaryWords);

export const isConstantName = (text: string): boolean => constantWords.test(plain(text));

/** "Outcome: Repairs" says its name; "Outcome" alone leaves it to the cell beside, and gives "". Null for other texts. */
export function outcomeNameIn(text: string): string | null {
  const found = outcomeWords.exec(text.trim());
  return found === null ? null : (found[1]?.trim() ?? "");
}

/** A word and its number in one text: "R² = 0.94", "n: 95". */
export function wordWithNumber(text: string): { readonly word: SummaryWord; readonly number: string }[] {
  return text.split(/[;,](?!\d)|\s{2,}/).flatMap((part) => {
    const [, word = "", number = ""] = /^\s*(.+?)\s*[=:]\s*([-+−]?[\d.,]+(?:\s?%)?)\s*$/.exec(part) ?? [];
    const found = word === "" ? null : summaryWordIn(word);
    return found === null ? [] : [{ word: found, number }];
  });
}
