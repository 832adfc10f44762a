/** The page's first script: styles, then the window. */
import { mount } from 'svelte'
import './styles/faces.css'
import './styles/tokens.css'
import './styles/base.css'
import './styles/form.css'
import App from './App.svelte'

const target = document.querySelector('#window')
if (target === null) throw new Error('The page has no place for the window.')
mount(App, { target })
