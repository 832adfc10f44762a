import type { Environment } from 'vitest/runtime'

/** Modules are compiled as for a page, so that state is reactive; Node's own globals stay, and there is no document. */
const page: Environment = {
  name: 'page',
  viteEnvironment: 'client',
  setup: () => ({ teardown: () => undefined }),
}

export default page
