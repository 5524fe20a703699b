import { createRouter, type Router, type RouterHistory } from 'vue-router'
import { routes } from './routes.js'

/** A router of its own for each page rendered and each browser tab. */
export function createAppRouter(history: RouterHistory): Router {
  return createRouter({
    history,
    routes,
    scrollBehavior(to, from, savedPosition) {
      if (savedPosition) return savedPosition
      if (to.hash) return { el: to.hash }
      // Refining a search changes the address, not the place.
      return to.path === from.path ? false : { top: 0 }
    },
  })
}
