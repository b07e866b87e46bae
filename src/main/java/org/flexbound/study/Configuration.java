package org.flexbound.study;

import java.util.Optional;
import org.flexbound.document.Json;
import org.flexbound.finding.Where;

/**
 * One arrangement of supports, parts and loads, with its log.
 *
 * @param name its name
 * @param log the load-test log's file, as the study names it; empty for a plan before any test
 * @param changes members, connections or supports removed, added or replaced in the model
 * @param where its place in the study
 */
public record Configuration(
    String name, Optional<String> log, Optional<Json> changes, Where where) {}
