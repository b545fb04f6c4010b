// A laboratory test of Ternmarsh sent with the generated types: a name that the service does not have would not compile.
import createClient from "openapi-fetch";
import type { paths } from "./generated/drypeak.js";

const [service] = process.argv.slice(2);
const client = createClient<paths>({ baseUrl: service! });

const { data, error } = await client.POST("/v1/moisture-density", {
  body: {
    reference: "Ternmarsh, pit 2",
    units: { density: "Mg/m3" },
    specimens: [[10, 1.75], [12, 1.82], [14, 1.86], [16, 1.83], [18, 1.77]].map(([waterContent, dryDensity]) => ({ waterContent, dryDensity })),
  },
});
if (error || typeof data === "string") {
  throw new Error(error ? `${error.title}: ${error.errors?.map(fault => fault.message).join(" ")}` : "A picture was answered.");
}

const refused = await client.POST("/v1/moisture-density", { body: { specimens: [] } });
console.log(JSON.stringify({
  reference: data.reference,
  maximumDryDensity: data.optimum?.maximumDryDensity,
  refused: refused.error?.errors?.map(fault => `${fault.pointer} ${fault.code}`),
}));
