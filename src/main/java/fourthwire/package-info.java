/** Fourthwire: a facility power-quality audit service. Only the application class lives here. */
@org.jspecify.annotations.NullMarked
package fourthwire;
