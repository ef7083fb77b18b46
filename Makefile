# Everything here also runs by npm; this file adds installing what is missing.
.DEFAULT_GOAL := help
.PHONY: help run test dev bench accuracy lint format clean build
export PORT ?= 4600

node_modules/.installed: package.json package-lock.json shared/package.json service/package.json dashboard/package.json .npmrc
	@node -e "const [a,b]=process.versions.node.split('.').map(Number); if(a!==20||b<19){console.error('Tailrace runs on Node.js 20 (20.19 or later); this is '+process.version+'.'); process.exit(1)}"
	npm ci
	@touch $@

build: node_modules/.installed ## compile shared, service and dashboard
	npm run --silent build

run: build ## install, build, migrate, bring in the demo plant on first start, serve on PORT (4600)
	DEMO=$${DEMO:-on} npm run --silent start

test: node_modules/.installed ## lint, types, unit, API, dashboard and browser tests
	@.ci/chromium
	npm test --silent

dev: build ## the same, rebuilding and restarting as files change (dashboard on 5173)
	$(MAKE) -j4 dev-shared dev-service dev-server dev-dashboard

.PHONY: dev-shared dev-service dev-server dev-dashboard
dev-shared:
	npm run --silent dev -w shared
dev-service:
	npm run --silent dev -w service
dev-server:
	DEMO=$${DEMO:-on} NODE_ENV=development node --watch service/dist/main.js
dev-dashboard:
	npm run --silent dev -w dashboard

bench: build ## measure the import and the core, beside a yardstick in the same run
	npm run --silent bench -w shared
	npm run --silent bench -w service

accuracy: build ## scenario families with known truth through the core (about ten minutes)
	npm run --silent accuracy

lint: node_modules/.installed ## eslint with the import boundaries, prettier
	npm run --silent build -w shared
	npm run --silent lint

format: node_modules/.installed ## prettier, writing
	npm run --silent format

clean: ## remove what building and running made (also the demo data in .data)
	rm -rf node_modules shared/node_modules service/node_modules dashboard/node_modules
	rm -rf shared/dist service/dist dashboard/dist .test-results .data

help: ## this list
	@grep -hE '^[a-z]+:.*##' $(MAKEFILE_LIST) | sed -E 's/^([a-z]+):[^#]*## /  make \1\t/' | expand -t 18
