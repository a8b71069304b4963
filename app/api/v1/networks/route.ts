/** `/networks` */
export {
  answer as DELETE,
  answer as GET,
  answer as HEAD,
  answer as OPTIONS,
  answer as PATCH,
  answer as POST,
  answer as PUT,
} from "../answer";
