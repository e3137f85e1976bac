/**
 * Templates: a schema's own shape with numbers that may also be written as expressions, "=carrierDbm - 3".
 * Refinements between fields are left out here; they hold when the template has been filled in.
 */
import { z } from 'zod';

/** "=" and then arithmetic over named values; what it may contain is decided by the bench's parser. */
export const expression = z
	.string()
	.min(2)
	.max(200)
	.startsWith('=', { message: 'an expression starts with "="' }) as unknown as z.ZodType<Expression>;
export type Expression = `=${string}`;

/** A number, or an expression that gives one when the parameters are drawn. */
export const numberOrExpression = z.union([z.number(), expression], {
	error: 'must be a number or an expression that starts with "="'
});

/** `T` with every number open to an expression. */
export type Template<T> = T extends number
	? T | Expression
	: T extends string | boolean | null | undefined
		? T
		: T extends (infer U)[]
			? Template<U>[]
			: { [K in keyof T]: Template<T[K]> };

/** A template when its numbers are in place. */
export type Filled<T> = T extends Expression
	? number
	: T extends string | number | boolean | null | undefined
		? T
		: T extends (infer U)[]
			? Filled<U>[]
			: { [K in keyof T]: Filled<T[K]> };

/** The template of a schema made of objects, arrays, unions, literals and numbers; unknown keys stay refused by name. */
export function templateOf<S extends z.ZodType>(schema: S): z.ZodType<Template<z.infer<S>>> {
	return rebuilt(schema) as unknown as z.ZodType<Template<z.infer<S>>>;
}

/** The template of an object schema as an object schema, so that a caller may add keys to it. */
export function templateObject(schema: z.ZodObject): z.ZodObject {
	const shape = Object.entries(schema.def.shape).map(([key, value]) => [key, rebuilt(value as z.ZodType)]);
	return z.strictObject(Object.fromEntries(shape));
}

function rebuilt(schema: z.ZodType): z.ZodType {
	if (schema instanceof z.ZodOptional) return rebuilt(schema.unwrap() as z.ZodType).optional();
	if (schema instanceof z.ZodNullable) return rebuilt(schema.unwrap() as z.ZodType).nullable();
	if (schema instanceof z.ZodNumber) return numberOrExpression;
	if (schema instanceof z.ZodArray) return z.array(rebuilt(schema.element as z.ZodType));
	if (schema instanceof z.ZodObject) return templateObject(schema);
	if (schema instanceof z.ZodDiscriminatedUnion) {
		const options = schema.options.map((option) => rebuilt(option as z.ZodType)) as z.ZodObject[];
		return z.discriminatedUnion(schema.def.discriminator, options as [z.ZodObject, ...z.ZodObject[]]);
	}
	if (schema instanceof z.ZodUnion) return rebuiltUnion(schema.options as z.ZodType[]);
	return schema;
}

function rebuiltUnion(options: z.ZodType[]): z.ZodType {
	const numeric = options.some(
		(option) => option instanceof z.ZodLiteral && typeof option.value === 'number'
	);
	const members = options.map(rebuilt);
	return z.union(numeric ? [...members, expression] : members);
}
