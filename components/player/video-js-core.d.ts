declare module "video.js/core" {
  export { default } from "video.js";
}
