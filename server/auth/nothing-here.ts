/** The answer to an address that is not listed, whole in itself: no page of ours is asked to draw it. */
const page = `<!doctype html>
<html lang="en">
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="color-scheme" content="light dark">
<title>Nothing here · Sillwright</title>
<style>
body { margin: 18vh auto 0; max-width: 400px; padding: 0 18px; font: 15px/1.45 system-ui, sans-serif;
  background: light-dark(#e7e4db, #171614); color: light-dark(#17191e, #f0ebe0); }
h1 { font-size: 32px; line-height: 1.2; }
a { color: light-dark(#2438b4, #9fb2ff); }
</style>
<h1>There is nothing at this address</h1>
<p>The address may be mistyped, or what stood here was moved.</p>
<p><a href="/">Go to your start page</a></p>
</html>
`;

export function nothingHereResponse(): Response {
  return new Response(page, { status: 404, headers: { 'content-type': 'text/html; charset=utf-8' } });
}
