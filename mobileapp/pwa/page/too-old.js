// Read only by browsers that don't know modules, so written in the JavaScript they do know.
document.documentElement.setAttribute("data-app", "failed");
document.documentElement.setAttribute("data-offline", "failed");
window.onload = function () {
  document.getElementById("doing").textContent =
    "This browser is too old for the app. Update it, or open the app in another one.";
};
