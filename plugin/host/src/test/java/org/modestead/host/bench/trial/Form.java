package org.modestead.host.bench.trial;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.openqa.selenium.Keys;
import org.openqa.selenium.WebElement;
import org.openqa.selenium.support.ui.Select;

/** Fills the open dialog of a step as a person does: chooses, ticks, types. */
record Form(Browser browser) {

    /** Sets stored values; a field that is shown only for the value of another one comes after that one is set. */
    void fill(JsonNode settings) {
        List<Map.Entry<String, JsonNode>> open = new ArrayList<>();
        open.addAll(settings.properties());
        while (!open.isEmpty()) {
            List<Map.Entry<String, JsonNode>> shown = open.stream().filter(one -> browser.has(setting(one.getKey()))).toList();
            if (shown.isEmpty()) {
                browser.see(setting(open.get(0).getKey()));
                continue;
            }
            shown.forEach(one -> set(one.getKey(), one.getValue()));
            open.removeAll(shown);
        }
    }

    /** Sets one field. */
    void set(String key, JsonNode value) {
        WebElement field = browser.see("[data-field=\"" + key + "\"]");
        String role = field.getTagName() + ":" + field.getAttribute("type");
        if (value.isArray() && browser.has(setting(key) + " [data-column]")) {
            value.forEach(name -> browser.click(setting(key) + " [data-column=\"" + name.asText() + "\"]"));
        } else if (role.startsWith("select")) {
            new Select(field).selectByValue(value.asText());
        } else if (browser.has(setting(key) + " [data-option]")) {
            browser.click(setting(key) + " [data-option=\"" + value.asText() + "\"]");
        } else if (role.equals("input:checkbox")) {
            if (field.isSelected() != value.asBoolean()) {
                field.click();
            }
        } else {
            String glue = role.startsWith("textarea") ? "\n" : ", ";
            field.sendKeys(Keys.chord(Keys.CONTROL, "a"), Keys.DELETE, value.isArray() ? joined(value, glue) : value.asText());
        }
    }

    private static String joined(JsonNode values, String glue) {
        List<String> texts = new ArrayList<>();
        values.forEach(value -> texts.add(value.asText()));
        return String.join(glue, texts);
    }

    private static String setting(String key) {
        return "[data-setting=\"" + key + "\"]";
    }
}
