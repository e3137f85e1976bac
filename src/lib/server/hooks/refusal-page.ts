const ESCAPES: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' };

const escape = (text: string): string => text.replace(/[&<>"]/g, (sign) => ESCAPES[sign]);

const POLICY =
	"default-src 'none'; style-src 'self'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'";

/** A refusal made before any route is reached: a plain page for whoever reads pages, JSON for all others. */
export function refusalPage(request: Request, status: number, message: string): Response {
	if (!request.headers.get('accept')?.includes('text/html')) {
		return Response.json({ message }, { status });
	}
	const page = `<!doctype html>
<html lang="en">
	<head>
		<meta charset="utf-8" />
		<meta name="viewport" content="width=device-width, initial-scale=1" />
		<title>Refused · Sweepwright</title>
		<link rel="stylesheet" href="/plain-page.css" />
	</head>
	<body>
		<p><a href="/">Sweepwright</a></p>
		<h1>This request was refused</h1>
		<p>${escape(message)}</p>
	</body>
</html>
`;
	return new Response(page, {
		status,
		headers: { 'content-type': 'text/html; charset=utf-8', 'content-security-policy': POLICY }
	});
}
