import { index, type RouteConfig, route } from '@react-router/dev/routes'

/** The least that the framework can do: a page, data and a write, each with one statement of the database. */
export default [index('page.tsx'), route('data', 'data.ts'), route('insert', 'insert.ts')] satisfies RouteConfig
