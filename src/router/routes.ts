import type { RouteRecordRaw } from 'vue-router'

/** Every address of the product; each view is loaded when it is first opened. */
export const routes: RouteRecordRaw[] = [
  { path: '/', name: 'home', component: () => import('../views/HomeView.vue') },
  { path: '/species', name: 'species-list', component: () => import('../views/SpeciesListView.vue') },
  { path: '/species/:slug', name: 'species', component: () => import('../views/SpeciesView.vue') },
  {
    path: '/species/:slug/revisions',
    name: 'revisions',
    component: () => import('../views/RevisionsView.vue'),
  },
  {
    path: '/species/:slug/revisions/:number(\\d+)',
    name: 'species-revision',
    component: () => import('../views/SpeciesView.vue'),
  },
  {
    path: '/species/:slug/check',
    name: 'species-check',
    component: () => import('../views/SpeciesCheckView.vue'),
  },
  { path: '/check', name: 'check', component: () => import('../views/CheckView.vue') },
  { path: '/sources', name: 'sources', component: () => import('../views/SourcesView.vue') },
  { path: '/sources/:id', name: 'source', component: () => import('../views/SourceView.vue') },
  { path: '/about', name: 'about', component: () => import('../views/AboutView.vue') },
  { path: '/method', name: 'method', component: () => import('../views/MethodView.vue') },
  { path: '/attributions', name: 'attributions', component: () => import('../views/AttributionsView.vue') },
  { path: '/terms', name: 'terms', component: () => import('../views/TermsView.vue') },
  { path: '/privacy', name: 'privacy', component: () => import('../views/PrivacyView.vue') },
  { path: '/:path(.*)*', name: 'not-found', component: () => import('../views/NotFoundView.vue') },
]
