import { register } from "./register.js";

// In a shared runtime the host's library stands before this script; a host that is late says when it is there.
if (typeof CustomFunctions !== "undefined") register(CustomFunctions);
else if (typeof Office !== "undefined") {
  Office.onReady(() => {
    if (typeof CustomFunctions !== "undefined") register(CustomFunctions);
  });
}
