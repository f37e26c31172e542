/** Journeys need the built application. */
export default async function setup() {}
