/** What no page of ours sends: bodies that are no JSON, bodies with one part bent, forms that are none. */

const long = 'x'.repeat(5000);

/** [what it is, text, content type] */
export function notJson(good: unknown): [string, BodyInit, string | undefined][] {
	const json = 'application/json';
	const text = JSON.stringify(good);
	return [
		['nothing', '', json],
		['half an object', '{', json],
		['null', 'null', json],
		['a list', '[]', json],
		['a text', '"x"', json],
		['not a number', 'NaN', json],
		['bytes', new Uint8Array([0xff, 0xfe, 0x00, 0x80]), json],
		['70 kB', `{"a":"${'x'.repeat(70_000)}"}`, json],
		['a form', 'a=1&b=2', 'application/x-www-form-urlencoded'],
		['JSON said to be text', text, 'text/plain'],
		['JSON said to be a form', text, 'application/x-www-form-urlencoded'],
		['JSON of no type', new TextEncoder().encode(text), undefined]
	];
}

/** Stands for a number beyond all numbers, which JSON can write and JavaScript reads as infinite. */
const BEYOND = '@beyond@';

/** [path of the part, what was done to it, the body as text]: each part of a body once with everything it can't be. */
export function bentBodies(good: unknown): [string, string, string][] {
	const strangeWhole = JSON.stringify({ ...(good as object), strange: 1 });
	const ofWhole: [string, string, string] = ['strange', 'a part that it does not know', strangeWhole];
	const ofParts = partsOf(good).flatMap(([path, value]): [string, string, string][] => {
		const bend = (what: string, to: unknown): [string, string, string] => [
			path,
			what,
			JSON.stringify(replaced(good, path.split('.'), to)).replace(`"${BEYOND}"`, '1e999')
		];
		if (Array.isArray(value)) return [bend('a text', 'x'), bend('an object', { strange: 1 })];
		if (typeof value === 'object' && value !== null) {
			const strange = replaced(good, [...path.split('.'), 'strange'], {});
			return [
				bend('a text', 'x'),
				bend('a number', 7),
				bend('a list', [1]),
				bend('null', null),
				[`${path}.strange`, 'a part that it does not know', JSON.stringify(strange)]
			];
		}
		const scalars = [
			bend('an object', { strange: true }),
			bend('far too long', long),
			bend('hugely negative', -1e308),
			bend('beyond all numbers', BEYOND)
		];
		if (typeof value !== 'boolean') scalars.push(bend('yes', true));
		if (typeof value === 'number') scalars.push(bend('huge', 1e308), bend('NaN in words', 'NaN'));
		return scalars;
	});
	return [ofWhole, ...ofParts];
}

/** Every part of a structure with its path, "settings.traces.0.mode". */
function partsOf(value: unknown, path: string[] = []): [string, unknown][] {
	const here: [string, unknown][] = path.length > 0 ? [[path.join('.'), value]] : [];
	if (typeof value !== 'object' || value === null) return here;
	return [...here, ...Object.entries(value).flatMap(([key, part]) => partsOf(part, [...path, key]))];
}

function replaced(whole: unknown, path: string[], to: unknown): unknown {
	const copy = structuredClone(whole) as Record<string, unknown>;
	const holder = path
		.slice(0, -1)
		.reduce<Record<string, unknown>>((part, key) => part[key] as Record<string, unknown>, copy);
	holder[path[path.length - 1]] = to;
	return copy;
}

interface BadForm {
	what: string;
	body: BodyInit;
	headers?: Record<string, string>;
	/** The field that the refusal must name. */
	field?: string;
}

export function badForms(good: Record<string, string>): BadForm[] {
	const fields = Object.keys(good);
	const text = new URLSearchParams(good).toString();
	const of = (type: string) => ({ 'content-type': type });
	const having = (field: string, value: string | Blob): FormData => {
		const form = new FormData();
		for (const name of fields) form.append(name, name === field ? value : good[name]);
		return form;
	};
	return [
		{ what: 'JSON', body: JSON.stringify(good), headers: of('application/json') },
		{ what: 'a form said to be text', body: text, headers: of('text/plain') },
		{ what: 'a form of no type', body: new TextEncoder().encode(text) },
		{ what: 'half a multipart form', body: '--x--\r\n', headers: of('multipart/form-data; boundary=y') },
		{ what: 'a multipart form without its boundary', body: text, headers: of('multipart/form-data') },
		...fields.flatMap((field): BadForm[] => [
			{ what: `${field} blank`, field, body: new URLSearchParams({ ...good, [field]: '' }) },
			{ what: `${field} missing`, field, body: without(good, field) },
			{ what: `${field} far too long`, field, body: having(field, long) },
			{ what: `${field} a file`, field, body: having(field, new Blob(['x'])) }
		])
	];
}

const without = (good: Record<string, string>, field: string): URLSearchParams =>
	new URLSearchParams(Object.entries(good).filter(([name]) => name !== field));
