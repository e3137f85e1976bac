/** What the bench's command line says of itself; kinds and fields come from the schemas, so that they can't differ. */
import { z } from 'zod';
import { benchRequest } from '$lib/schemas/reading';
import { quantity } from '$lib/schemas/quantity';
import { receiverProfile } from '$lib/schemas/receiver';
import { device, emitter } from '$lib/schemas/scene';
import { settings } from '$lib/schemas/settings';

interface JsonSchema {
	properties?: Record<string, JsonSchema & { const?: unknown; enum?: unknown[]; type?: string }>;
	required?: string[];
	oneOf?: JsonSchema[];
	anyOf?: JsonSchema[];
}

const schemaOf = (schema: z.ZodType): JsonSchema =>
	z.toJSONSchema(schema, { unrepresentable: 'any' }) as JsonSchema;

/** "frequencyHz levelDbm phaseNoise?": required ones first. */
function fieldsOf({ properties = {}, required = [] }: JsonSchema): string {
	const names = Object.keys(properties).filter((name) => name !== 'kind');
	const needed = names.filter((name) => required.includes(name));
	return [...needed, ...names.filter((name) => !needed.includes(name)).map((name) => `${name}?`)].join(' ');
}

const kindsOf = (schema: z.ZodType): string =>
	(schemaOf(schema).oneOf ?? schemaOf(schema).anyOf ?? [])
		.map((option) => `  ${String(option.properties?.kind?.const).padEnd(20)} ${fieldsOf(option)}`)
		.join('\n');

export const benchHelp = (): string => `The bench: npm run -s bench -- VERB FILE|-    (JSON in, JSON out)

sweep  {scene, receiver?, settings?, seed?, sweeps?}   rows of detected levels, flags, traces
read   {trace, reading} or, for a count, {scene, receiver?, settings?, seed?, sweeps?, reading}
truth  {scene, quantity}                               an exact quantity of the scene
proof  EXERCISE --seeds N --from-seed K                whether an exercise is sound
help   this page

Bad input ends with exit 2 and one line that names the field; a reading that has no number ends with exit 3.

scene     {emitters: [...], device?: {${fieldsOf(schemaOf(device))}}, path?: [{frequencyHz, lossDb}, ...]}
emitters
${kindsOf(emitter)}

receiver  "field", "modest", or {${fieldsOf(schemaOf(receiverProfile))}}
settings  {${fieldsOf(schemaOf(settings))}}
seed      a whole number from 0 to 2^53-1, or a string

readings
${kindsOf(benchRequest)}

quantities
${kindsOf(quantity)}
`;
