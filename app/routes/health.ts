/** The process answers: all that a restart could mend. Whether it can serve is asked of health/ready. */
export function loader() {
  return Response.json({ status: 'ok' })
}
