"use strict";
/*
 * Small helps for the calculator: a ± follows the unit that is chosen beside its value, and what was left empty or belongs to
 * another pair stays out of the address. Without this script the server does the same with the ±.
 */
(() => {
  const form = document.querySelector("form.calc");
  if (!form) return;

  const figures = value => Number(value.toPrecision(2)).toString();
  for (const select of form.querySelectorAll("select.unit")) {
    const field = select.closest(".measured");
    const plusMinus = field.querySelector("input.pm");
    const standsIn = field.querySelector("input[type=hidden]");
    select.addEventListener("change", () => {
      const chosen = select.selectedOptions[0];
      for (const same of form.querySelectorAll(`[data-unit-of="${select.name.replace(/Unit$/, "")}"]`)) same.textContent = chosen.textContent;
      if (!plusMinus || !standsIn) return;
      const was = [...select.options].find(option => option.value === standsIn.value);
      const value = Number(plusMinus.value.replace(",", "."));
      if (was && plusMinus.value !== "" && !Number.isNaN(value)) {
        plusMinus.value = figures(value * Number(was.dataset.factor) / Number(chosen.dataset.factor));
      }
      standsIn.value = chosen.value;
      field.querySelector("[data-pm-unit]").textContent = chosen.textContent;
    });
  }

  const fields = () => [...form.elements].filter(e => e.name && e.name !== "temp");
  form.addEventListener("submit", () => {
    for (const field of fields()) {
      const unused = field.closest(".measured")?.offsetParent === null && !field.closest("details");
      if (field.value === "" || unused) field.disabled = true;
    }
  });
  addEventListener("pageshow", () => { for (const field of fields()) field.disabled = false; });
})();
