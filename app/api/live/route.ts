/** Liveness: this process answers. Touches nothing else, unlike /api/health. */
export const GET = () => new Response(null, { status: 204 });
