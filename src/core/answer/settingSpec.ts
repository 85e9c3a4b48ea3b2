import { transformsOf } from "./settingReaders.ts";
import type { NotUnderstood, Settings } from "./settingValues.ts";

/** One setting: its name, what it takes, what holds when it is not given, and what it does. */
export interface SettingSpec {
  readonly name: string;
  readonly values: string;
  readonly standard: string;
  readonly meaning: string;
  readonly read: (text: string, settings: Settings) => Settings | NotUnderstood;
}

export const option =
  <K extends keyof Settings["options"]>(key: K, read: (text: string) => Settings["options"][K] | NotUnderstood) =>
  (text: string, settings: Settings): Settings | NotUnderstood => {
    const value = read(text);
    return isNotUnderstood(value) ? value : { ...settings, options: { ...settings.options, [key]: value } };
  };

export const plain =
  <K extends keyof Settings>(key: K, read: (text: string) => Settings[K] | NotUnderstood) =>
  (text: string, settings: Settings): Settings | NotUnderstood => {
    const value = read(text);
    return isNotUnderstood(value) ? value : { ...settings, [key]: value };
  };

export const isNotUnderstood = (value: unknown): value is NotUnderstood =>
  typeof value === "object" && value !== null && "allowed" in value;

export const transformed =
  (kind: "logarithm" | "square" | "lag" | "change" | "growth rate") =>
  (text: string, settings: Settings): Settings => ({
    ...settings,
    transforms: [...settings.transforms, ...transformsOf(kind, text)],
  });
