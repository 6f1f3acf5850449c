import { keepOffline } from "../../../../src/hosts/bench/offline/keepOffline.js";

keepOffline((takeOver) => {
  document.documentElement.dataset.offered = "yes";
  Object.assign(globalThis, { takeOver });
});
