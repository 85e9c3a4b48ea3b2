import { describe, expect, it } from "vitest";
import { functionTable } from "../../src/functions/functionTable.ts";
import { functionsMetadata } from "../../src/functions/metadata.ts";
import { registerFunctions } from "../../src/functions/register.ts";
import { inlineAnalyst } from "../../src/worker/inlineAnalyst.ts";
import { functionsRuntime } from "../support/functionsRuntime.ts";

const metadata = functionsMetadata();
const { functions } = metadata;

describe("what Excel is told of the functions", () => {
  it("lets errors and rich cells through to them", () => {
    expect(metadata.allowErrorForDataTypeAny).toBe(true);
    expect(metadata.allowCustomDataForDataTypeAny).toBe(true);
  });

  it("names them as Excel allows: three capitals or more, no cell address, each once", () => {
    const ids = functions.map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
    for (const { id, name } of functions) {
      expect(name).toBe(id);
      expect(id).toMatch(/^[A-Z][A-Z0-9_.]{2,127}$/);
      expect(id).not.toMatch(/^[A-Z]{1,3}\d+$/);
    }
  });

  it("takes cells as they are, has no volatile function and can cancel all", () => {
    for (const { options, parameters, result } of functions) {
      const overData = parameters[0]?.name === "outcome";
      expect(options).toEqual({ cancelable: true, ...(overData && { requiresParameterAddresses: true }) });
      expect(result).toEqual({ dimensionality: "matrix" });
      for (const { name, type, dimensionality } of parameters) {
        expect(type).toBe("any");
        if (["outcome", "drivers", "settings", "key"].includes(name)) expect(dimensionality).toBe("matrix");
      }
    }
  });

  it("keeps optional parameters last, each with a description that Excel can show", () => {
    for (const { parameters, description } of functions) {
      expect(description.length).toBeLessThan(256);
      const optional = parameters.map((parameter) => parameter.optional);
      expect(optional).toEqual(optional.toSorted((a, b) => Number(a) - Number(b)));
      expect(new Set(parameters.map(({ name }) => name)).size).toBe(parameters.length);
      for (const parameter of parameters) expect(parameter.description.length).toBeLessThan(256);
    }
  });

  it("links each to its section of the help page", () => {
    for (const { id, helpUrl } of functions) expect(helpUrl).toBe(`FOOTING_URL/help.html#${id.toLowerCase()}`);
  });

  it("has an implementation behind each name and none besides", () => {
    const { runtime, functions: known } = functionsRuntime();
    registerFunctions(runtime, inlineAnalyst);
    expect([...known.keys()].toSorted()).toEqual(functionTable.map(({ id }) => id).toSorted());
  });
});
