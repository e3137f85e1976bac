/** Who gets in where: house.md's table, door by door. */
import { roles, type Role } from '$lib/server/domain/role';

export interface Reach {
	/** Of an attempt: who gets in where it is somebody else's. */
	who: 'everybody' | readonly Role[];
	/** What the path's id names. */
	thing?: 'attempt';
	/** Of an attempt: there is nothing for its owner before it has closed. */
	absentWhileOpen?: boolean;
	/** The path names nothing that exists here: whoever may ask is told so. */
	absent?: boolean;
	/** A body that is read without complaint, so that the refusal is one of the person. */
	body?: unknown;
	/** Parts of it that may be as long as a file. */
	longTexts?: readonly string[];
	/** The same where a form is sent. */
	form?: Record<string, string>;
	query?: string;
}

const everybody: Reach = { who: 'everybody' };
const signedIn: Reach = { who: roles };
const learners: Reach = { who: ['apprentice', 'instructor', 'administrator'] };
/** Nobody but the owner, whatever their role. */
const owner: Reach = { who: [], thing: 'attempt' };
/** Also whoever may read everybody's attempts. */
const readable: Reach = { who: ['administrator'], thing: 'attempt' };
const authors: Reach = { who: ['instructor', 'administrator'] };
/** Of a course that has no draft. */
const ofDraft: Reach = { ...authors, absent: true };
const PATH = '06-spread/lesson.md';
const settings = {
	centreHz: 450e6,
	spanHz: 1e6,
	rbwHz: 30e3,
	vbwHz: 'auto',
	points: 101,
	detector: 'average',
	scale: 'power',
	referenceDbm: -10,
	attenuationDb: 10,
	preamp: false,
	correctionDb: [{ frequencyHz: 450e6, db: 4.7 }],
	input: { connected: true, padDb: 10, dcBlock: true },
	traces: [{ mode: 'average', count: 4 }]
};
const markings = {
	markers: [{ letter: 'A', at: 450e6, trace: 1 }],
	selected: 'A',
	readings: [
		{
			request: { kind: 'channel-power', centreHz: 450e6, widthHz: 2e5 },
			trace: 1,
			values: { centreHz: 450e6 }
		}
	],
	levelUnit: 'dBm',
	antenna: [{ frequencyHz: 450e6, dbPerM: 18.4 }]
};
const trialAnswer = {
	token: 'none',
	text: '-23',
	unit: 'dBm',
	looks: [{ choice: 0, sweeps: 1 }],
	row: 0,
	fromHz: 450e6,
	toHz: 450.1e6
};

export const REACH: Record<string, Reach> = {
	'layout /': everybody,
	'load /': everybody,
	'load /sign-in': everybody,
	'action /sign-in?/default': { ...everybody, form: { email: 'nobody@tarnvale.example', password: 'none' } },
	'POST /sign-out': everybody,
	'POST /scheme': { ...everybody, form: { scheme: 'night' } },
	'POST /api/trial': { ...everybody, absent: true },
	'POST /api/trial/rows': { ...everybody, absent: true, body: { token: 'none', choice: 0, row: 0 } },
	'POST /api/trial/answers': { ...everybody, absent: true, body: trialAnswer },

	'load /account': signedIn,
	'action /account?/name': { ...signedIn, form: { displayName: 'Anna' } },
	'action /account?/password': {
		...signedIn,
		form: { presentPassword: 'none', newPassword: 'six steady sweeps', newPasswordAgain: 'six steady sweeps' }
	},
	'action /account?/end': { ...signedIn, form: { session: '999999' } },
	'action /account?/endOthers': signedIn,
	'action /account?/endAll': signedIn,

	'load /learn': learners,
	'load /teach': { who: ['instructor', 'administrator'] },
	'load /teach/courses': authors,
	'action /teach/courses?/create': {
		...authors,
		form: { title: 'Quay', summary: 'From the quay.', unit: 'First steps' }
	},
	'action /teach/courses?/start': { ...authors, absent: true },
	'load /teach/courses/[course]': { ...authors, absent: true },
	'action /teach/courses/[course]?/change': { ...authors, absent: true },
	'action /teach/courses/[course]?/publish': { ...authors, absent: true },
	'load /teach/courses/[course]/[unit]/[file]': { ...authors, absent: true },
	'PUT /api/drafts/[course]/files': {
		...ofDraft,
		body: { path: PATH, text: 'x', revision: 1 },
		longTexts: ['text']
	},
	'POST /api/drafts/[course]/restorations': {
		...ofDraft,
		body: { path: PATH, versionId: 1, revision: 1 }
	},
	'POST /api/drafts/[course]/presence': { ...ofDraft, body: { path: PATH } },
	'GET /api/drafts/[course]/versions': { ...ofDraft, query: `?path=${PATH}` },
	'GET /api/drafts/[course]/versions/[id]': { ...ofDraft, query: `?path=${PATH}` },
	'GET /api/drafts/[course]/proofs': { ...ofDraft, query: `?path=${PATH}` },
	'POST /api/drafts/[course]/proofs': { ...ofDraft, body: { path: PATH } },
	'DELETE /api/drafts/[course]/proofs': { ...ofDraft, query: `?path=${PATH}` },
	'POST /api/drafts/[course]/previews/lesson': {
		...ofDraft,
		body: { text: 'A lesson.' },
		longTexts: ['text']
	},
	'POST /api/drafts/[course]/previews/exercise': {
		...ofDraft,
		body: { text: 'slug: [', path: PATH, seed: 1 },
		longTexts: ['text']
	},
	'POST /api/drafts/[course]/previews/figure': {
		...ofDraft,
		body: { text: 'No figure.', id: 'none', values: [] },
		longTexts: ['text']
	},
	'GET /api/drafts/[course]/zip': ofDraft,
	'POST /api/drafts/[course]/zip': ofDraft,
	'POST /api/drafts/zip': authors,
	'load /office': { who: ['coordinator', 'administrator'] },
	'load /company': { who: ['company-contact', 'administrator'] },
	'load /admin': { who: ['administrator'] },

	'load /learn/exercises/[slug]': learners,
	'action /learn/exercises/[slug]?/start': learners,
	'action /learn/exercises/[slug]?/practise': learners,
	'load /learn/skills': learners,
	'load /learn/glossary': learners,
	'load /learn/logbook': learners,
	'load /learn/logbook/[id]': { ...learners, absent: true },
	'action /learn/logbook/[id]?/note': { ...learners, absent: true },
	'action /learn/logbook/[id]?/remove': { ...learners, absent: true },
	'GET /learn/logbook/csv': learners,
	'GET /learn/logbook/pdf': { ...learners, absent: true, query: '?entry=999999' },
	'load /learn/find': learners,
	'load /learn/units/[slug]': { ...learners, absent: true },
	'POST /api/attempts': { ...learners, body: { exercise: 'spread-carrier-1' } },
	'POST /api/figures/[unitId]/[figureId]': { ...learners, absent: true, body: { values: { rbwHz: 1000 } } },
	'GET /api/set-ups': learners,
	'POST /api/set-ups': { ...learners, body: { name: 'narrow', settings } },
	'DELETE /api/set-ups/[id]': { ...learners, absent: true },

	'load /learn/attempts/[id]': readable,
	'load /learn/attempts/[id]/finding': readable,
	'load /learn/attempts/[id]/done-right': readable,
	'load /learn/attempts/[id]/report': readable,
	'action /learn/attempts/[id]/report?/keep': owner,
	'GET /api/attempts/[id]': readable,
	'GET /api/attempts/[id]/set-ups': readable,
	'GET /api/attempts/[id]/rows': { ...readable, query: '?from=0&to=0' },
	'GET /api/attempts/[id]/finding': readable,
	'GET /api/attempts/[id]/done-right': readable,
	'GET /api/attempts/[id]/done-right/rows': { ...readable, query: '?step=0' },
	'POST /api/attempts/[id]/abandonment': owner,
	'POST /api/attempts/[id]/acknowledgements': { ...owner, body: { row: 0 } },
	'POST /api/attempts/[id]/answers': { ...owner, body: { answers: { power: { text: '-23', unit: 'dBm' } } } },
	'PUT /api/attempts/[id]/drafts': {
		...owner,
		body: { answers: { power: { text: '-23', unit: 'dBm', readingId: null } } }
	},
	'POST /api/attempts/[id]/hints': owner,
	'POST /api/attempts/[id]/logbook': { ...owner, body: { kind: 'set-up' } },
	'PUT /api/attempts/[id]/markings': { ...owner, body: { markings } },
	'POST /api/attempts/[id]/readings': {
		...owner,
		body: { rows: { from: 0, to: 1 }, trace: 1, request: { kind: 'peak' } }
	},
	'POST /api/attempts/[id]/sweeps': { ...owner, body: { settings, from: 0, sweeps: 1 } }
};
