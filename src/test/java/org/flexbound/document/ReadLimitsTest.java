package org.flexbound.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;

class ReadLimitsTest {
  @Test
  void eachLimitIsChangedByItsOwnName() {
    for (String name : ReadLimits.USUAL.byName().keySet()) {
      ReadLimits changed = ReadLimits.USUAL.with(name, 17).orElseThrow();
      assertThat(changed.byName()).containsEntry(name, 17L);
      ReadLimits.USUAL.byName().forEach(
          (other, value) -> {
            if (!other.equals(name)) {
              assertThat(changed.byName()).containsEntry(other, value);
            }
          });
    }
    assertThat(ReadLimits.USUAL.with("no such", 1)).isEmpty();
  }

  @Test
  void aLimitOfNothingIsRefused() {
    assertThatThrownBy(() -> ReadLimits.USUAL.with("rows", 0))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessage("a limit on reading is at least 1");
  }
}
