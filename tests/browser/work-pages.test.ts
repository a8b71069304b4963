import { checkPages } from "./page-checks";
import { WORK_PAGES } from "./pages";

checkPages(WORK_PAGES);
