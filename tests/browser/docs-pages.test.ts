import { checkPages } from "./page-checks";
import { DOCS_PAGES } from "./pages";

checkPages(DOCS_PAGES);
