/** Workflow files: reading, checking everything at once, and the plan that is left when nothing is wrong. */
package org.modestead.host.workflow;
